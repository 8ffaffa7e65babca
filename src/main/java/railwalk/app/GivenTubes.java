package railwalk.app;

import railwalk.device.DataFile;
import railwalk.fit.GivenTubeFit;
import railwalk.fit.TypeSheet;
import railwalk.netlist.LawFitter;

/** Fits the types that a netlist gives by their points. */
final class GivenTubes implements LawFitter {
  @Override
  public Fitted fitted(DataFile file) {
    DataFile fitted = GivenTubeFit.fitted(file);
    return new Fitted(fitted, TypeSheet.of(fitted).worstErrorShare());
  }
}
