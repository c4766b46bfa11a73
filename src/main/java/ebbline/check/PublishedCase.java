package ebbline.check;

import java.util.Objects;

/**
 * One published output of one worked example, as its source prints it.
 *
 * @param id unique name of the case
 * @param topic heading under which it is shown
 * @param inputs the example's inputs, a JSON object
 * @param published what the source prints; empty where only a recomputation stands
 * @param recomputed the same quantity in 30–40-digit arithmetic, made independently of the program
 * @param provenance whether the figure was read in the source, remembered, or derived
 * @param source author, title, edition, place
 */
public record PublishedCase(
    String id,
    String topic,
    String inputs,
    String published,
    String recomputed,
    String provenance,
    String source) {

  public PublishedCase {
    Objects.requireNonNull(id, "id");
    Objects.requireNonNull(topic, "topic");
    Objects.requireNonNull(inputs, "inputs");
    Objects.requireNonNull(published, "published");
    Objects.requireNonNull(recomputed, "recomputed");
    Objects.requireNonNull(provenance, "provenance");
    Objects.requireNonNull(source, "source");
  }

  /** The figure that a computation is held against, and whether a source printed it. */
  String reference() {
    return isPublished() ? published : recomputed;
  }

  /** Whether a published figure stands; what we recomputed ourselves is never called published. */
  public boolean isPublished() {
    return !published.isEmpty() && !provenance.equals("own recomputation");
  }
}
