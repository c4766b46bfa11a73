/**
 * What is owed, when, and who may choose: instruments as immutable records that turn into plain
 * flows and rights. Holds no prices and no curve.
 *
 * <p>Floor 2 of the house; see {@code docs/floors.puml} for what it may import.
 */
package ebbline.instrument;
