package ebbline.data;

import ebbline.instrument.Instrument;
import java.util.Optional;
import java.util.Set;

/** How one kind of instrument stands in a book: its name, its columns, and how a row is read. */
interface RowKind {

  /** What the column {@code instrument} says. */
  String name();

  /** Columns that the kind uses besides {@code id}, {@code instrument} and {@code face}. */
  Set<String> columns();

  /** The instrument; empty where the row has problems, which the cells have collected. */
  Optional<? extends Instrument> read(RowCells cells);
}
