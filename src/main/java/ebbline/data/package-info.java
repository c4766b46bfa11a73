/**
 * Files to domain objects: curves, books, model files. OpenCSV and Jackson stay behind this
 * package; every bad cell is reported with its place.
 *
 * <p>Floor 7 of the house; see {@code docs/floors.puml} for what it may import.
 */
package ebbline.data;
