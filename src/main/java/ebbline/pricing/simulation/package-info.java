/**
 * Random paths of the state and its integral, exact at chosen times: point sets, their order,
 * normals, and the work's division into chunks. Knows no claim and no price.
 *
 * <p>Floor 4 of the house, below the pricers; see {@code docs/floors.puml} for what it may import.
 */
package ebbline.pricing.simulation;
