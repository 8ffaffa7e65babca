package railwalk.app;

import railwalk.device.Catalogue;
import railwalk.fit.TubeFit;

/** Works out the constants of a type's law anew from its published points. */
public final class FitJob {
  private FitJob() {}

  /** Returns the type's data file with its constants fitted anew, ready to take its place. */
  public static String run(String name) throws CannotDo {
    String type = TubesJob.file(name).name();
    return new TubeFit(Catalogue.standard()).refit(type).dataFile();
  }
}
