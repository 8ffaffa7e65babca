package railwalk.app;

import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.TreeSet;
import java.util.stream.Stream;
import railwalk.device.Catalogue;
import railwalk.device.DataFile;
import railwalk.device.Heater;
import railwalk.device.LikeSections;
import railwalk.device.SectionKind;
import railwalk.device.TubeType;
import railwalk.units.Measure;
import railwalk.units.ValueReader;
import railwalk.units.ValueReading;

/**
 * Which types of the catalogue are asked for.
 *
 * @param base base code or kind of socket: "9A", "noval"
 * @param heater volts, amperes or both of one rated connection: "6.3V", "0.3A", "6.3V 0.3A"
 * @param kind "triode", "pentode", "beam", "rectifier", "regulator" or "diode"
 */
public record TubeFilter(Optional<String> base, Optional<String> heater, Optional<String> kind) {
  /** The kinds that can be asked for. */
  public static final List<String> KINDS =
      List.of("triode", "pentode", "beam", "rectifier", "regulator", "diode");

  /** How far a heater's figure may be from the one asked for: 6 V asks for 6.3 V too. */
  private static final double HEATER_SHARE = 0.06;

  /** Returns the types that are asked for; refuses a word that asks for none. */
  List<TubeType> of(Catalogue catalogue) throws CannotDo {
    List<TubeType> types = catalogue.types();
    if (base.isPresent()) {
      types = withBase(types, base.get());
    }
    if (heater.isPresent()) {
      types = withHeater(types, heater.get());
    }
    if (kind.isPresent()) {
      types = ofKind(types, kind.get().toLowerCase(Locale.ROOT), catalogue);
    }
    if (types.isEmpty()) {
      throw new CannotDo("no type in the catalogue is all of that");
    }
    return types;
  }

  private static List<TubeType> withBase(List<TubeType> types, String word) throws CannotDo {
    List<TubeType> found =
        types.stream()
            .filter(t -> word.equalsIgnoreCase(t.base()) || word.equalsIgnoreCase(t.family()))
            .toList();
    if (found.isEmpty()) {
      TreeSet<String> families = new TreeSet<>(types.stream().map(TubeType::family).toList());
      throw new CannotDo(
          "no base "
              + word
              + ": name a kind of socket ("
              + String.join(", ", families)
              + ") or a base code such as 9A");
    }
    return found;
  }

  private static List<TubeType> withHeater(List<TubeType> types, String words) throws CannotDo {
    double volts = Double.NaN;
    double amps = Double.NaN;
    for (String word : words.strip().split("[\\s,]+", -1)) {
      boolean isAmps = ValueReader.statedMeasure(word).equals(Optional.of(Measure.CURRENT));
      Measure measure = isAmps ? Measure.CURRENT : Measure.VOLTAGE;
      if (!(ValueReader.read(word, measure) instanceof ValueReading.Value value)
          || !(value.amount() > 0)) {
        throw new CannotDo("heater " + words + ": expected volts, amperes or both: 6.3V 0.3A");
      }
      if (isAmps) {
        amps = value.amount();
      } else {
        volts = value.amount();
      }
    }
    double wantedVolts = volts;
    double wantedAmps = amps;
    List<TubeType> found =
        types.stream()
            .filter(
                type ->
                    type.heater().connections().stream()
                        .anyMatch(c -> agrees(c, wantedVolts, wantedAmps)))
            .toList();
    if (found.isEmpty()) {
      throw new CannotDo("no type has a heater of " + words);
    }
    return found;
  }

  private static boolean agrees(Heater.Connection connection, double volts, double amps) {
    return !(Math.abs(connection.volts() / volts - 1) > HEATER_SHARE)
        && !(Math.abs(connection.amps() / amps - 1) > HEATER_SHARE);
  }

  private static List<TubeType> ofKind(List<TubeType> types, String word, Catalogue catalogue)
      throws CannotDo {
    if (!KINDS.contains(word)) {
      throw new CannotDo("no kind " + word + ": one of " + String.join(", ", KINDS));
    }
    return types.stream().filter(type -> kinds(type, catalogue).anyMatch(word::equals)).toList();
  }

  private static Stream<String> kinds(TubeType type, Catalogue catalogue) {
    boolean glows = type.sections().stream().anyMatch(s -> s.kind() == SectionKind.REGULATOR);
    if (glows) {
      return Stream.of("regulator");
    }
    return catalogue.file(type.name()).stream()
        .map(DataFile::likeSections)
        .flatMap(List::stream)
        .map(LikeSections::kind);
  }
}
