/**
 * A discount curve from market quotes: quotes as equations in discount factors, curves that reprice
 * them or come nearest, parametric curves, and how far to trust the result. Knows years, no dates
 * and no files.
 *
 * <p>Floor 5 of the house; see {@code docs/floors.puml} for what it may import.
 */
package ebbline.fitting.quotes;
