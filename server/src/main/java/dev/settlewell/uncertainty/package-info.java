/**
 * Measurement uncertainty after JCGM 100 (the GUM) and JCGM 101: what independent contributions
 * come to together.
 *
 * <p>Pure functions and small immutable types, doubles in whatever one unit the caller keeps to. A
 * limit is never taken for a standard deviation: each {@link
 * dev.settlewell.uncertainty.Distribution} says which it is.
 */
package dev.settlewell.uncertainty;
