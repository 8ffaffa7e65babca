package railwalk.diagnosis;

import java.io.BufferedReader;
import java.io.IOException;
import java.io.InputStream;
import java.io.InputStreamReader;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.EnumMap;
import java.util.Map;

/** How often parts fail, one kind of fault against another: {@code frequency.csv} read. */
final class Frequency {
  private static final String TABLE = "/railwalk/diagnosis/frequency.csv";

  private final Map<FaultKind, Double> weights = new EnumMap<>(FaultKind.class);

  private Frequency() {}

  /** Returns the table that comes with Railwalk. */
  static Frequency standard() {
    Frequency frequency = new Frequency();
    try (InputStream in = Frequency.class.getResourceAsStream(TABLE)) {
      if (in == null) {
        throw new IllegalStateException("no resource " + TABLE);
      }
      BufferedReader lines = new BufferedReader(new InputStreamReader(in, StandardCharsets.UTF_8));
      for (String line = lines.readLine(); line != null; line = lines.readLine()) {
        if (!line.startsWith("#") && !line.startsWith("kind,")) {
          String[] cells = line.split(",", 3);
          frequency.weights.put(FaultKind.valueOf(cells[0]), Double.valueOf(cells[1]));
        }
      }
    } catch (IOException failure) {
      throw new UncheckedIOException(failure);
    }
    for (FaultKind kind : FaultKind.values()) {
      if (!frequency.weights.containsKey(kind)) {
        throw new IllegalStateException(TABLE + " has no line for " + kind);
      }
    }
    return frequency;
  }

  /** Returns how often one part has a fault of {@code kind}. */
  double weight(FaultKind kind) {
    Double weight = weights.get(kind);
    return weight == null ? 0 : weight;
  }
}
