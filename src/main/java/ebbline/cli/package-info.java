/**
 * The command line: one small class a command, five lines of wiring each. The only package that
 * touches the standard streams and the exit status.
 *
 * <p>Floor 8 of the house; see {@code docs/floors.puml} for what it may import.
 */
package ebbline.cli;
