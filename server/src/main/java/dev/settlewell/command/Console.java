package dev.settlewell.command;

import java.io.InputStream;
import java.io.OutputStream;
import java.nio.file.Path;
import java.time.LocalDate;
import java.util.Map;

/**
 * Everything a command takes from the machine, so that nothing else depends on it.
 *
 * @param folder where the tool was started; paths are shown relative to it
 * @param terminal whether {@code out} is read by a person
 * @param today the day acceptances are judged on unless an option says otherwise
 */
public record Console(
    InputStream in,
    OutputStream out,
    OutputStream err,
    Path folder,
    Map<String, String> environment,
    boolean terminal,
    LocalDate today,
    String version) {}
