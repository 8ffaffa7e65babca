package railwalk.device;

/**
 * What an {@link AmplifierLaw} answers in one call: the currents into plate, screen and grid
 * (ampere, positive inwards) and their partial derivatives (siemens). A caller keeps one and has it
 * filled again and again; it is no value to pass on.
 */
public final class SectionCurrents {
  public double plateAmps;
  public double screenAmps;
  public double gridAmps;

  public double plateByPlateSiemens;
  public double plateByScreenSiemens;
  public double plateByGridSiemens;
  public double screenByPlateSiemens;
  public double screenByScreenSiemens;
  public double screenByGridSiemens;
  public double gridByPlateSiemens;
  public double gridByScreenSiemens;
  public double gridByGridSiemens;

  /** Sets every figure to zero. */
  public void clear() {
    plateAmps = screenAmps = gridAmps = 0;
    plateByPlateSiemens = plateByScreenSiemens = plateByGridSiemens = 0;
    screenByPlateSiemens = screenByScreenSiemens = screenByGridSiemens = 0;
    gridByPlateSiemens = gridByScreenSiemens = gridByGridSiemens = 0;
  }
}
