package org.wintersill.io.vector;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.sql.Connection;
import java.sql.PreparedStatement;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Statement;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.sqlite.SQLiteConfig;
import org.sqlite.SQLiteConnection;
import org.sqlite.SQLiteLimits;
import org.wintersill.problem.Problem;
import org.wintersill.problem.ProblemException;

/**
 * A GeoPackage that is only ever read. The file is opened as one that nobody changes, functions and tables that its schema could
 * reach are not trusted, and only plain tables are asked: views, virtual tables and triggers of the file never run.
 */
final class PackageDatabase implements AutoCloseable {
    /** Longest text or blob that is taken, bytes: some fifteen million points. */
    private static final int LONGEST_VALUE = 256 << 20;

    private final Path file;
    private final Connection connection;

    private PackageDatabase(Path file, Connection connection) {
        this.file = file;
        this.connection = connection;
    }

    /** @throws ProblemException when the file is no sound database, or has changes waiting beside it */
    static PackageDatabase open(Path file) {
        Path waiting = file.resolveSibling(file.getFileName() + "-wal");
        try {
            if (Files.exists(waiting) && Files.size(waiting) > 0) {
                throw Problem.input("the file has changes that wait in " + waiting.getFileName() + ": another program has it open",
                        file.toString(), "Save and close it there, or give a copy saved under another name").asException();
            }
            SQLiteConfig config = new SQLiteConfig();
            config.setReadOnly(true);
            Connection connection = config.createConnection("jdbc:sqlite:" + file.toAbsolutePath().toUri().toASCIIString()
                    + "?mode=ro&immutable=1");
            PackageDatabase database = new PackageDatabase(file, connection);
            ((SQLiteConnection) connection).setLimit(SQLiteLimits.SQLITE_LIMIT_LENGTH, LONGEST_VALUE);
            database.execute("PRAGMA trusted_schema = OFF");
            database.execute("PRAGMA query_only = ON");
            database.execute("PRAGMA cell_size_check = ON");
            return database;
        } catch (IOException e) {
            throw Problem.input("the file cannot be read: " + e.getMessage(), file.toString(), "").asException(e);
        } catch (SQLException e) {
            throw damaged(file, e);
        }
    }

    private void execute(String sql) throws SQLException {
        try (Statement statement = connection.createStatement()) {
            statement.execute(sql);
        }
    }

    /** Refuses the file by what the driver says. */
    static ProblemException damaged(Path file, SQLException cause) {
        return Problem.input("the GeoPackage cannot be read: " + String.valueOf(cause.getMessage()).split("\n")[0], file.toString(),
                "Check that the file is complete, and fetch or make it again").asException(cause);
    }

    ProblemException damaged(SQLException cause) {
        return damaged(file, cause);
    }

    /** Whether a plain table of this name exists: no view, no virtual table. */
    boolean hasPlainTable(String table) {
        List<Map<String, Object>> rows = rows("SELECT type, sql FROM sqlite_master WHERE name = ? COLLATE NOCASE AND type IN ('table', 'view')",
                table);
        return rows.size() == 1 && "table".equals(rows.get(0).get("type"))
                && !String.valueOf(rows.get(0).get("sql")).stripLeading().toUpperCase(java.util.Locale.ROOT).matches("(?s)CREATE\\s+VIRTUAL.*");
    }

    /** All rows of a query on tables that were looked at before, column to value; for short tables only. */
    List<Map<String, Object>> rows(String sql, Object... values) {
        List<Map<String, Object>> rows = new ArrayList<>();
        try (PreparedStatement statement = connection.prepareStatement(sql)) {
            for (int i = 0; i < values.length; i++) {
                statement.setObject(i + 1, values[i]);
            }
            try (ResultSet result = statement.executeQuery()) {
                while (result.next()) {
                    Map<String, Object> row = new LinkedHashMap<>();
                    for (int c = 1; c <= result.getMetaData().getColumnCount(); c++) {
                        row.put(result.getMetaData().getColumnName(c), result.getObject(c));
                    }
                    rows.add(row);
                }
            }
        } catch (SQLException e) {
            throw damaged(e);
        }
        return rows;
    }

    /** A statement whose rows are fetched one by one; the caller closes it. */
    PreparedStatement prepare(String sql) throws SQLException {
        return connection.prepareStatement(sql);
    }

    /** A name as SQL takes it, whatever letters it has. */
    static String quoted(String name) {
        return '"' + name.replace("\"", "\"\"") + '"';
    }

    @Override
    public void close() {
        try {
            connection.close();
        } catch (SQLException e) {
            throw damaged(e);
        }
    }
}
