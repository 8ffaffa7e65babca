package railwalk.device;

/** What a {@link TwoPoleLaw} answers: current from anode to cathode and its slope. */
public final class TwoPoleCurrent {
  public double amps;
  public double siemens;
}
