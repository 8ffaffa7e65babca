package railwalk.chart;

import railwalk.device.Electrode;
import railwalk.device.PinUse;
import railwalk.device.TubeType;

/** What a pin leads to, in a few words. */
final class PinWords {
  private PinWords() {}

  /** Returns the words for a drawing or a list: "plate A", "heater", "leave free". */
  static String of(TubeType type, PinUse use) {
    String letter = use.section().isEmpty() ? "" : " " + use.section();
    return leadsTo(type, use) + letter;
  }

  private static String leadsTo(TubeType type, PinUse use) {
    Electrode electrode = use.electrode();
    return switch (use.role()) {
      case ELECTRODE ->
          electrode == null
              ? ""
              : electrode.isHeater() && type.heater().directlyHeated()
                  ? electrode(electrode).replace("heater", "filament")
                  : electrode(electrode);
      case EMPTY -> "nothing";
      case INTERNAL -> "leave free";
      case SHIELD -> "shield";
      case SLEEVE -> "shell";
    };
  }

  private static String electrode(Electrode electrode) {
    return switch (electrode) {
      case HEATER1, HEATER2 -> "heater";
      case HEATER_TAP -> "heater tap";
      case PLATE1 -> "plate 1";
      case PLATE2 -> "plate 2";
      case DIODE1 -> "diode 1";
      case DIODE2 -> "diode 2";
      case PLATE, SCREEN, SUPPRESSOR, GRID, CATHODE -> electrode.word();
    };
  }
}
