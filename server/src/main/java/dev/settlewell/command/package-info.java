/**
 * The command line: options, exit codes, colours, and the one writer of files. What is computed and
 * how it is told stands below.
 */
package dev.settlewell.command;
