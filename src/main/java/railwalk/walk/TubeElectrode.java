package railwalk.walk;

import railwalk.circuit.Element;
import railwalk.device.Electrode;

/**
 * One electrode of one tube section.
 *
 * @param tube an amplifier section or a stand-in
 */
public record TubeElectrode(Element tube, Electrode electrode) {
  /** Returns whether supply current flows into it, as into a plate or a screen. */
  boolean fed() {
    return electrode == Electrode.PLATE || electrode == Electrode.SCREEN;
  }
}
