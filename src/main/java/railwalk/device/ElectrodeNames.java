package railwalk.device;

import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalInt;
import java.util.regex.Pattern;

/** How people write electrodes and socket pins. */
public final class ElectrodeNames {
  private static final Map<String, Electrode> WORDS =
      Map.ofEntries(
          Map.entry("plate", Electrode.PLATE),
          Map.entry("anode", Electrode.PLATE),
          Map.entry("a", Electrode.PLATE),
          Map.entry("p", Electrode.PLATE),
          Map.entry("grid", Electrode.GRID),
          Map.entry("g1", Electrode.GRID),
          Map.entry("g", Electrode.GRID),
          Map.entry("screen", Electrode.SCREEN),
          Map.entry("g2", Electrode.SCREEN),
          Map.entry("suppressor", Electrode.SUPPRESSOR),
          Map.entry("g3", Electrode.SUPPRESSOR),
          Map.entry("bp", Electrode.SUPPRESSOR),
          Map.entry("cathode", Electrode.CATHODE),
          Map.entry("k", Electrode.CATHODE),
          Map.entry("plate1", Electrode.PLATE1),
          Map.entry("anode1", Electrode.PLATE1),
          Map.entry("a1", Electrode.PLATE1),
          Map.entry("p1", Electrode.PLATE1),
          Map.entry("plate2", Electrode.PLATE2),
          Map.entry("anode2", Electrode.PLATE2),
          Map.entry("a2", Electrode.PLATE2),
          Map.entry("p2", Electrode.PLATE2),
          Map.entry("diode1", Electrode.DIODE1),
          Map.entry("d1", Electrode.DIODE1),
          Map.entry("diode2", Electrode.DIODE2),
          Map.entry("d2", Electrode.DIODE2),
          Map.entry("heater1", Electrode.HEATER1),
          Map.entry("h1", Electrode.HEATER1),
          Map.entry("f1", Electrode.HEATER1),
          Map.entry("heater2", Electrode.HEATER2),
          Map.entry("h2", Electrode.HEATER2),
          Map.entry("f2", Electrode.HEATER2),
          Map.entry("heatertap", Electrode.HEATER_TAP));

  private static final Pattern PIN = Pattern.compile("\\d{1,2}");
  private static final String CAP = "cap";

  private ElectrodeNames() {}

  /** Returns the electrode that {@code word} names. */
  public static Optional<Electrode> electrode(String word) {
    return Optional.ofNullable(WORDS.get(word.toLowerCase(Locale.ROOT)));
  }

  /** Returns the socket pin that {@code word} names, 0 for the top cap. */
  public static OptionalInt pin(String word) {
    if (word.equalsIgnoreCase(CAP)) {
      return OptionalInt.of(0);
    }
    return PIN.matcher(word).matches()
        ? OptionalInt.of(Integer.parseInt(word))
        : OptionalInt.empty();
  }

  /** Returns how a message names a pin. */
  public static String pinName(int pin) {
    return pin == 0 ? "top cap" : "pin " + pin;
  }

  /** Returns the electrode words, for suggestions. */
  public static List<String> all() {
    return WORDS.keySet().stream().filter(word -> word.length() > 3).sorted().toList();
  }
}
