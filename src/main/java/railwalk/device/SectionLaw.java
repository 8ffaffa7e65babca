package railwalk.device;

/** The law of one section of a tube: three electrodes and more, two poles, or a glow discharge. */
public sealed interface SectionLaw permits AmplifierLaw, TwoPoleLaw, GasLaw {}
