package org.wintersill.io.yaml;

import java.io.IOException;
import java.io.InputStream;
import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.CodingErrorAction;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.util.List;
import java.util.regex.Pattern;
import org.snakeyaml.engine.v2.api.LoadSettings;
import org.snakeyaml.engine.v2.api.lowlevel.Parse;
import org.snakeyaml.engine.v2.exceptions.Mark;
import org.snakeyaml.engine.v2.exceptions.MarkedYamlEngineException;
import org.snakeyaml.engine.v2.exceptions.ReaderException;
import org.snakeyaml.engine.v2.exceptions.YamlEngineException;
import org.snakeyaml.engine.v2.exceptions.YamlVersionException;
import org.wintersill.problem.NearestName;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;

/** Reads a YAML file or text into {@link YamlValue}s. */
public final class YamlReader {
    /** No run file or list of cultivars comes near it (assumed). */
    static final int LARGEST_FILE = 4 * 1024 * 1024;

    private static final Pattern UNQUOTED_PATTERN = Pattern.compile("(^|[\\[,:-])\\s*\\*");

    private final Problem.Kind kind;

    /** @param kind kind of the problems: usage for run files, input for cultivar files */
    public YamlReader(Problem.Kind kind) {
        this.kind = kind;
    }

    /**
     * Reads a file.
     *
     * @throws ProblemException when it cannot be read, is no UTF-8 text or no YAML, naming the line
     */
    public YamlValue read(Path file) {
        String name = file.toString();
        byte[] bytes;
        try (InputStream in = Files.newInputStream(file)) {
            bytes = in.readNBytes(LARGEST_FILE + 1);
        } catch (NoSuchFileException e) {
            throw problem("there is no such file", name, nearby(file)).asException(e);
        } catch (IOException e) {
            throw problem(Files.isDirectory(file) ? "this is a folder, not a file" : "the file cannot be read", name,
                    Files.isDirectory(file) ? "Name the file in it" : "Check its permissions").asException(e);
        }
        if (bytes.length > LARGEST_FILE) {
            throw problem("the file is larger than " + LARGEST_FILE / 1024 / 1024 + " MiB, far more than such a file needs", name,
                    "Check that it is the right file").asException();
        }
        return parse(decoded(bytes, name), name);
    }

    /**
     * Reads a text.
     *
     * @param name stands before the line number in places; if it begins with {@code --} it is the place itself
     * @throws ProblemException when it is no YAML, naming the line
     */
    public YamlValue parse(String text, String name) {
        LoadSettings settings = LoadSettings.builder().setLabel(name).setCodePointLimit(LARGEST_FILE).build();
        try {
            return new EventTree(new Parse(settings).parseString(text).iterator(), name, kind).document();
        } catch (MarkedYamlEngineException e) {
            String place = e.getProblemMark().or(e::getContextMark)
                    .map(mark -> EventTree.place(name, mark.getLine() + 1)).orElse(name);
            throw problem("this is not YAML: " + plain(e.getProblem()), place,
                    hint(e.getProblem(), text, e.getProblemMark().or(e::getContextMark).map(Mark::getLine).orElse(0))).asException(e);
        } catch (ReaderException e) {
            throw problem("there is a character that YAML does not allow (code " + e.getCodePoint() + ")",
                    EventTree.place(name, lineOf(text, e.getPosition())), "Save the file as plain UTF-8 text").asException(e);
        } catch (YamlVersionException e) {
            throw problem("only YAML 1.2 is read", EventTree.place(name, 1), "Remove the line that begins with %YAML").asException(e);
        } catch (YamlEngineException e) {
            throw problem("this is not YAML: " + plain(e.getMessage()), name, "").asException(e);
        }
    }

    private String decoded(byte[] bytes, String name) {
        try {
            String text = StandardCharsets.UTF_8.newDecoder().onMalformedInput(CodingErrorAction.REPORT)
                    .onUnmappableCharacter(CodingErrorAction.REPORT).decode(ByteBuffer.wrap(bytes)).toString();
            return text.startsWith("\ufeff") ? text.substring(1) : text;
        } catch (CharacterCodingException e) {
            throw problem("the file is not UTF-8 text", name, "Save it with the encoding UTF-8").asException(e);
        }
    }

    private static int lineOf(String text, int position) {
        int end = Math.min(Math.max(position, 0), text.length());
        return 1 + (int) text.substring(0, end).chars().filter(c -> c == '\n').count();
    }

    private static String plain(String message) {
        String oneLine = message == null ? "" : message.replaceAll("\\(Do not use .*", "").replaceAll("\\s+", " ").trim();
        return oneLine.endsWith(".") ? oneLine.substring(0, oneLine.length() - 1) : oneLine;
    }

    private static String hint(String message, String text, int line) {
        String there = text.lines().skip(line).findFirst().orElse("");
        if (there.startsWith("\t")) {
            return "Indent with blanks, not with tabs";
        }
        if (UNQUOTED_PATTERN.matcher(there).find()) {
            return "A text that begins with * (such as the pattern *.nc) needs quotation marks: '*.nc'";
        }
        if (message != null && message.contains("mapping values are not allowed")) {
            return "Check the indentation, and put texts that contain ': ' in quotation marks";
        }
        return "Check the brackets, the quotation marks and the indentation";
    }

    private static String nearby(Path file) {
        Path folder = file.toAbsolutePath().getParent();
        if (folder == null || !Files.isDirectory(folder)) {
            return "Check the path: its folder does not exist either";
        }
        String name = String.valueOf(file.getFileName());
        List<String> names = Neighbours.names(folder);
        return NearestName.of(name, names).map(near -> "Did you mean " + near + "?")
                .orElse("Check the path");
    }

    private Problem problem(String what, String where, String remedy) {
        return new Problem(kind, what, where, remedy);
    }
}
