package railwalk.device;

import java.io.IOException;
import java.io.InputStream;
import java.io.UncheckedIOException;
import java.nio.charset.StandardCharsets;
import java.util.EnumMap;
import java.util.HashMap;
import java.util.Map;
import java.util.Set;
import railwalk.source.SourceText;

/**
 * How long cathodes take, by kind: the table {@code warmup} beside the types' files. A type's own
 * {@code warmup=} on its heater line goes before it.
 */
public final class WarmUpTimes {
  private static final String RESOURCE = "warmup";

  private final Map<CathodeKind, Double> seconds = new EnumMap<>(CathodeKind.class);
  private final Map<CathodeKind, String> sources = new EnumMap<>(CathodeKind.class);

  private WarmUpTimes(SourceText text) {
    Map<String, String> texts = new HashMap<>();
    for (DataLine line : DataLine.of(text)) {
      if (line.key().equals("source")) {
        texts.put(line.word(0), line.rest(1));
      }
    }
    for (DataLine line : DataLine.of(text)) {
      if (line.key().equals("cathode")) {
        line.allow(Set.of("seconds", "source"));
        CathodeKind kind = kind(line);
        seconds.put(kind, line.required("seconds"));
        sources.put(kind, texts.getOrDefault(line.option("source", ""), ""));
      }
    }
    seconds.put(CathodeKind.COLD, 0.0);
  }

  private static CathodeKind kind(DataLine line) {
    for (CathodeKind kind : CathodeKind.values()) {
      if (kind.word().equals(line.word(0))) {
        return kind;
      }
    }
    throw line.error(0, "no such kind of cathode: " + line.word(0), "");
  }

  /** Returns the table that comes with Railwalk. */
  public static WarmUpTimes standard() {
    try (InputStream in = WarmUpTimes.class.getResourceAsStream(RESOURCE)) {
      if (in == null) {
        throw new IllegalStateException("there is no table of warm-up times");
      }
      return new WarmUpTimes(
          SourceText.of(RESOURCE, new String(in.readAllBytes(), StandardCharsets.UTF_8)));
    } catch (IOException e) {
      throw new UncheckedIOException(e);
    }
  }

  /** Returns the seconds until a cathode of {@code kind} gives nine tenths of its current. */
  public double seconds(CathodeKind kind) {
    Double found = seconds.get(kind);
    if (found == null) {
      throw new IllegalStateException("no warm-up time for " + kind.word());
    }
    return found;
  }

  /** Returns where that figure comes from; empty for what needs no heating. */
  public String source(CathodeKind kind) {
    return sources.getOrDefault(kind, "");
  }

  /** Returns how a section of {@code kind} in a tube of {@code type} warms up. */
  public WarmUpLaw law(TubeType type, SectionKind kind) {
    CathodeKind cathode = CathodeKind.of(type, kind);
    double own = type.heater().warmUpSeconds();
    return new WarmUpLaw(cathode == CathodeKind.COLD || Double.isNaN(own) ? seconds(cathode) : own);
  }

  /** Returns how a tube of unknown type warms up: as most do. */
  public WarmUpLaw law() {
    return new WarmUpLaw(seconds(CathodeKind.INDIRECT));
  }
}
