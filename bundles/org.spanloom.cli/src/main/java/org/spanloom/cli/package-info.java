/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
/**
 * The command line: checks and lays out models, lists solutions and bases, for people and for build
 * servers.
 *
 * <pre>
 *   arguments -> Main -> CheckCommand | SolveCommand | BasisCommand -> analysis -> ResultSink
 *                          |  FormatCommand -> language ---------------------> ResultSink
 *                          |                                                         |
 *                     ModelSearch, ModelFile                                  stdout or a file
 * </pre>
 *
 * <table>
 *   <caption>Who does what</caption>
 *   <tr><td>{@link org.spanloom.cli.Main}</td><td>picks the command; the one place where a failure becomes a
 *       message and an exit code</td></tr>
 *   <tr><td>the command classes</td><td>one each: its options, its help text, its run</td></tr>
 *   <tr><td>ModelSearch, ModelFile</td><td>find and read model files, with limits</td></tr>
 *   <tr><td>ResultSink</td><td>standard output, or a file that appears whole or not at all</td></tr>
 *   <tr><td>NumberText, CsvTable, TextTable</td><td>numbers and tables as text</td></tr>
 * </table>
 *
 * <p>Results go to standard output and nothing else does; messages, error estimates and progress go
 * to standard error. Text is UTF-8 with line feeds on every system, numbers have a decimal point in
 * every locale: the same model gives the same bytes. Exit codes are those of {@code ExitCode}.
 */
package org.spanloom.cli;
