package steelyard.results.ledger;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.SortedMap;
import java.util.TreeMap;

/** Reads a sweep's blocks back. */
final class PlannedBlocks {

  private static final String QUERY =
      """
      SELECT b.number, b.seed, c.position, c.key, n.family, n.alias, n.variant, n.backend,
        n.setting, f.digest AS family_code, i.name AS instance, b.path, i.content, b.class,
        b.weight, r.amendments, k.adapter, k.version, k.digest AS code, o.options
      FROM sweep s JOIN block b ON b.sweep = s.id JOIN cell c ON c.block = b.id
        JOIN candidate n ON n.id = c.candidate JOIN recipe r ON r.id = c.recipe
        JOIN family_code f ON f.id = r.family_code JOIN instance i ON i.id = b.instance
        JOIN backend_build k ON k.id = c.backend_build JOIN settings o ON o.id = c.settings
      WHERE s.name = ? ORDER BY b.number, c.position""";

  private final SortedMap<Integer, Long> seeds = new TreeMap<>();
  private final Map<Integer, List<Cell>> cells = new HashMap<>();
  private final Map<String, List<String>> amendments = new HashMap<>();
  private final Map<String, SortedMap<String, String>> options = new HashMap<>();

  private PlannedBlocks() {}

  /** The blocks by number, their cells by position. */
  static List<Block> of(Store store, String sweep) {
    PlannedBlocks blocks = new PlannedBlocks();
    store.scan(QUERY, blocks::take, sweep);
    return blocks.seeds.entrySet().stream()
        .map(e -> new Block(e.getKey(), e.getValue(), blocks.cells.get(e.getKey())))
        .toList();
  }

  private void take(ResultSet row) throws SQLException {
    int number = row.getInt("number");
    seeds.put(number, row.getLong("seed"));
    cells.computeIfAbsent(number, n -> new ArrayList<>()).add(cell(row));
  }

  private Cell cell(ResultSet row) throws SQLException {
    return new Cell(
        row.getInt("position"),
        recipe(row),
        new BackendBuild(
            row.getString("backend"),
            row.getString("adapter"),
            row.getString("version"),
            Digest.of(row.getBytes("code"))),
        new Setting(
            row.getString("setting"),
            options.computeIfAbsent(row.getString("options"), RecordJson::pairs)),
        RunKey.of(row.getBytes("key")));
  }

  private Recipe recipe(ResultSet row) throws SQLException {
    String alias = row.getString("alias");
    return new Recipe(
        row.getString("family"),
        alias.isEmpty() ? Optional.empty() : Optional.of(alias),
        Digest.of(row.getBytes("family_code")),
        new Recipe.Instance(
            row.getString("instance"),
            row.getString("path"),
            Digest.of(row.getBytes("content")),
            row.getString("class"),
            row.getDouble("weight")),
        amendments.computeIfAbsent(row.getString("amendments"), RecordJson::strings),
        row.getString("variant"));
  }
}
