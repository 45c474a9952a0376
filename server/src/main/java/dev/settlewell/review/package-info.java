/**
 * What a reviewer reads: one renderer an output, and the comparison of two revisions. Everything
 * here is a pure function from computed sheets to text.
 */
package dev.settlewell.review;
