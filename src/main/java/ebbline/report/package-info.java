/**
 * Results to tables, CSV and JSON. The only place that formats a figure.
 *
 * <p>Floor 7 of the house; see {@code docs/floors.puml} for what it may import.
 */
package ebbline.report;
