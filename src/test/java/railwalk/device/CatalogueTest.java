package railwalk.device;

import static org.assertj.core.api.Assertions.assertThat;

import org.junit.jupiter.api.Test;

/** The catalogue's names: aliases, suffixes, near misses; and that every file reads. */
class CatalogueTest {
  private final Catalogue catalogue = Catalogue.standard();

  @Test
  void everyFileReadsAndTheIndexAgreesWithIt() {
    assertThat(catalogue.types()).hasSizeGreaterThanOrEqualTo(27);
    for (TubeType type : catalogue.types()) {
      assertThat(catalogue.find(type.name())).contains(type);
      for (String alias : type.aliases()) {
        assertThat(catalogue.find(alias)).contains(type);
      }
      assertThat(catalogue.file(type.name()).orElseThrow().points()).isNotNull();
      assertThat(type.pins()).isNotEmpty();
    }
  }
}
