package railwalk.readings;

/**
 * What the cell of a reading says.
 *
 * @param kind as given, or as the figure's unit tells; DC where neither does
 * @param kindTold whether one of the two does; the unit volt tells no kind
 * @param amount volt, ohm or ampere; infinite ohms for an open path
 */
record Figure(ReadingKind kind, boolean kindTold, double amount) {}
