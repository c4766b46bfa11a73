/**
 * Hull and White's and Vasicek's models calibrated to the quotes of options. Floor 5; knows no
 * files and no dates.
 */
package ebbline.fitting.options;
