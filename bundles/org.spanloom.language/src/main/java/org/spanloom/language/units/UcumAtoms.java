/*
 * Copyright (c) 2026 Spanloom contributors
 *
 * SPDX-License-Identifier: EPL-2.0
 */
package org.spanloom.language.units;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;

/**
 * The unit symbols that are read, each defined by others down to m, g, s, A, K, mol and cd.
 *
 * <p>Source: Schadow and McDonald, The Unified Code for Units of Measure, version 2.1, tables 4 to
 * 24 (from memory, then compared with the units library that the tests use). Three values are
 * newer: eV, [e], [h] and [k] have the values that define the SI since 2019, u that of table 8 of
 * the SI Brochure, 9th edition, and AU that of the International Astronomical Union, 2012. Unlike
 * in UCUM, the mole is a base unit and the radian is 1.
 */
final class UcumAtoms {

  /** Base symbols in the order of {@link Dimension}; the gram stands for the mass. */
  static final List<String> BASES = List.of("m", "g", "s", "A", "K", "mol", "cd");

  private static final String TABLE =
      """
      m           m  1              .                     metre
      g           m  1              .                     gram
      s           m  1              .                     second
      A           m  1              .                     ampere
      K           m  1              .                     kelvin
      mol         m  1              .                     mole
      cd          m  1              .                     candela
      10*         -  10             1                     the number ten
      10^         -  10             1                     the number ten
      [pi]        -  3.1415926535897932384626433832795028841971693993751 1 the number pi
      %           -  1              10*-2                 percent
      [ppth]      -  1              10*-3                 parts per thousand
      [ppm]       -  1              10*-6                 parts per million
      [ppb]       -  1              10*-9                 parts per billion
      [pptr]      -  1              10*-12                parts per trillion
      rad         m  1              1                     radian
      sr          m  1              1                     steradian
      deg         -  2              [pi].rad/360          degree of angle
      '           -  1              deg/60                minute of angle
      ''          -  1              '/60                  second of angle
      gon         -  0.9            deg                   gon
      circ        -  2              [pi].rad              full turn
      sph         -  4              [pi].sr               full solid angle
      Hz          m  1              s-1                   hertz
      N           m  1              kg.m/s2               newton
      Pa          m  1              N/m2                  pascal
      J           m  1              N.m                   joule
      W           m  1              J/s                   watt
      C           m  1              A.s                   coulomb
      V           m  1              J/C                   volt
      F           m  1              C/V                   farad
      Ohm         m  1              V/A                   ohm
      S           m  1              Ohm-1                 siemens
      mho         m  1              S                     mho
      Wb          m  1              V.s                   weber
      T           m  1              Wb/m2                 tesla
      H           m  1              Wb/A                  henry
      lm          m  1              cd.sr                 lumen
      lx          m  1              lm/m2                 lux
      Bq          m  1              s-1                   becquerel
      Gy          m  1              J/kg                  gray
      Sv          m  1              J/kg                  sievert
      kat         m  1              mol/s                 katal
      U           m  1              umol/min              unit of enzyme activity
      [iU]        m  1              1                     international unit
      [IU]        m  1              1                     international unit
      eq          m  1              mol                   equivalent
      osm         m  1              mol                   osmole
      min         -  60             s                     minute
      h           -  60             min                   hour
      d           -  24             h                     day
      wk          -  7              d                     week
      a_t         -  365.24219      d                     tropical year
      a_j         -  365.25         d                     Julian year
      a_g         -  365.2425       d                     Gregorian year
      a           -  1              a_j                   year
      mo_s        -  29.53059       d                     synodal month
      mo_j        -  1              a_j/12                Julian month
      mo_g        -  1              a_g/12                Gregorian month
      mo          -  1              mo_j                  month
      l           m  1              dm3                   litre
      L           m  1              dm3                   litre
      st          m  1              m3                    stere
      ar          m  100            m2                    are
      b           -  100            fm2                   barn
      Ao          -  0.1            nm                    angstrom
      t           m  1e3            kg                    tonne
      u           m  1.66053906660e-27 kg                 unified atomic mass unit
      eV          m  1.602176634e-19 J                    electronvolt
      AU          -  149597870700   m                     astronomical unit
      pc          m  3.085678e16    m                     parsec
      [ly]        m  1              [c].a_j               light-year
      [c]         m  299792458      m/s                   speed of light
      [h]         m  6.62607015e-34 J.s                   Planck constant
      [k]         m  1.380649e-23   J/K                   Boltzmann constant
      [e]         m  1.602176634e-19 C                    elementary charge
      [g]         m  9.80665        m/s2                  standard acceleration of free fall
      bar         m  1e5            Pa                    bar
      atm         -  101325         Pa                    standard atmosphere
      att         -  1              kgf/cm2               technical atmosphere
      m[H2O]      m  9.80665        kPa                   metre of water column
      m[Hg]       m  133.3220       kPa                   metre of mercury column
      [in_i'H2O]  -  1              m[H2O].[in_i]/m       inch of water column
      [in_i'Hg]   -  1              m[Hg].[in_i]/m        inch of mercury column
      [PRU]       -  1              mm[Hg].s/ml           peripheral vascular resistance unit
      gf          m  1              g.[g]                 gram-force
      [lbf_av]    -  1              [lb_av].[g]           pound-force
      [psi]       -  1              [lbf_av]/[sin_i]      pound per square inch
      Gal         m  1              cm/s2                 gal
      dyn         m  1              g.cm/s2               dyne
      erg         m  1              dyn.cm                erg
      P           m  1              dyn.s/cm2             poise
      St          m  1              cm2/s                 stokes
      Ky          m  1              cm-1                  kayser
      Bi          m  10             A                     biot
      Mx          m  1e-8           Wb                    maxwell
      G           m  1e-4           T                     gauss
      Oe          m  250            /[pi].A/m             oersted
      Gb          m  1              Oe.cm                 gilbert
      sb          m  1              cd/cm2                stilb
      Lmb         -  1              cd/cm2/[pi]           lambert
      Ci          m  3.7e10         Bq                    curie
      R           m  2.58e-4        C/kg                  roentgen
      RAD         m  100            erg/g                 rad of absorbed dose
      REM         m  1              RAD                   rem
      cal_[15]    m  4.18580        J                     calorie at 15 Cel
      cal_[20]    m  4.18190        J                     calorie at 20 Cel
      cal_m       m  4.19002        J                     mean calorie
      cal_IT      m  4.1868         J                     international table calorie
      cal_th      m  4.184          J                     thermochemical calorie
      cal         m  1              cal_th                calorie
      [Cal]       -  1              kcal_th               nutrition calorie
      [Btu_IT]    -  1.05505585262  kJ                    international table British thermal unit
      [Btu_th]    -  1.054350       kJ                    thermochemical British thermal unit
      [Btu]       -  1              [Btu_th]              British thermal unit
      [HP]        -  550            [ft_i].[lbf_av]/s     horsepower
      [degR]      -  5              K/9                   degree Rankine
      [in_i]      -  2.54           cm                    inch
      [ft_i]      -  12             [in_i]                foot
      [yd_i]      -  3              [ft_i]                yard
      [mi_i]      -  5280           [ft_i]                mile
      [fth_i]     -  6              [ft_i]                fathom
      [nmi_i]     -  1852           m                     nautical mile
      [kn_i]      -  1              [nmi_i]/h             knot
      [mil_i]     -  1e-3           [in_i]                mil
      [cml_i]     -  1              [pi]/4.[mil_i]2       circular mil
      [hd_i]      -  4              [in_i]                hand
      [sin_i]     -  1              [in_i]2               square inch
      [sft_i]     -  1              [ft_i]2               square foot
      [syd_i]     -  1              [yd_i]2               square yard
      [cin_i]     -  1              [in_i]3               cubic inch
      [cft_i]     -  1              [ft_i]3               cubic foot
      [cyd_i]     -  1              [yd_i]3               cubic yard
      [gal_us]    -  231            [cin_i]               US gallon
      [bbl_us]    -  42             [gal_us]              barrel
      [qt_us]     -  1              [gal_us]/4            US quart
      [pt_us]     -  1              [qt_us]/2             US pint
      [gil_us]    -  1              [pt_us]/4             US gill
      [foz_us]    -  1              [gil_us]/4            US fluid ounce
      [fdr_us]    -  1              [foz_us]/8            US fluid dram
      [min_us]    -  1              [fdr_us]/60           US minim
      [tbs_us]    -  1              [foz_us]/2            US tablespoon
      [tsp_us]    -  1              [tbs_us]/3            US teaspoon
      [cup_us]    -  16             [tbs_us]              US cup
      [gal_br]    -  4.54609        l                     imperial gallon
      [qt_br]     -  1              [gal_br]/4            imperial quart
      [pt_br]     -  1              [qt_br]/2             imperial pint
      [gil_br]    -  1              [pt_br]/4             imperial gill
      [foz_br]    -  1              [gil_br]/5            imperial fluid ounce
      [gr]        -  64.79891       mg                    grain
      [lb_av]     -  7000           [gr]                  pound
      [oz_av]     -  1              [lb_av]/16            ounce
      [dr_av]     -  1              [oz_av]/16            dram
      [stone_av]  -  14             [lb_av]               stone
      [scwt_av]   -  100            [lb_av]               short hundredweight
      [lcwt_av]   -  112            [lb_av]               long hundredweight
      [ston_av]   -  20             [scwt_av]             short ton
      [lton_av]   -  20             [lcwt_av]             long ton
      [oz_tr]     -  480            [gr]                  troy ounce
      [lb_tr]     -  12             [oz_tr]               troy pound
      [car_m]     -  0.2            g                     metric carat
      tex         m  1              g/km                  tex
      [den]       -  1              g/9/km                denier
      [mesh_i]    -  1              /[in_i]               mesh
      [diop]      -  1              /m                    dioptre
      [S]         -  1e-13          s                     Svedberg unit
      g%          m  1              g/dl                  gram percent
      bit         m  1              1                     bit
      By          m  8              bit                   byte
      Bd          m  1              /s                    baud
      Cel         s  1              K                     degree Celsius
      [degF]      s  5              K/9                   degree Fahrenheit
      [degRe]     s  5              K/4                   degree Reaumur
      Np          l  1              1                     neper
      B           l  1              1                     bel
      B[SPL]      l  1              1                     bel of sound pressure
      B[V]        l  1              1                     bel of voltage
      B[mV]       l  1              1                     bel of voltage in millivolts
      B[uV]       l  1              1                     bel of voltage in microvolts
      B[W]        l  1              1                     bel of power
      B[kW]       l  1              1                     bel of power in kilowatts
      [pH]        l  1              1                     pH
      """;

  private static final Map<String, UcumAtom> ATOMS = read();

  private UcumAtoms() {}

  /** Returns the symbol of a code, matched exactly. */
  static Optional<UcumAtom> named(String code) {
    return Optional.ofNullable(ATOMS.get(code));
  }

  /** Returns all symbols, in the order of the table. */
  static Iterable<UcumAtom> all() {
    return ATOMS.values();
  }

  /** Returns the zero of a scale, in kelvin. */
  static ExactFactor zero(UcumAtom scale) {
    return switch (scale.code()) {
      case "[degF]" ->
          ExactFactor.of("459.67").times(ExactFactor.of("5")).over(ExactFactor.of("9"));
      default -> ExactFactor.of("273.15");
    };
  }

  /** Splits the table by hand: regular expressions would cost the command line's start 20 ms. */
  private static Map<String, UcumAtom> read() {
    Map<String, UcumAtom> atoms = new LinkedHashMap<>();
    String[] fields = new String[5];
    int at = 0;
    while (at < TABLE.length()) {
      int lineEnd = TABLE.indexOf('\n', at);
      for (int i = 0; i < 4; i++) {
        int end = TABLE.indexOf(' ', at);
        fields[i] = TABLE.substring(at, end);
        at = end;
        while (TABLE.charAt(at) == ' ') {
          at++;
        }
      }
      fields[4] = TABLE.substring(at, lineEnd);
      at = lineEnd + 1;
      UcumAtom.Kind kind = kind(fields[1].charAt(0));
      atoms.put(fields[0], new UcumAtom(fields[0], kind, fields[2], fields[3], fields[4]));
    }
    return Collections.unmodifiableMap(atoms);
  }

  private static UcumAtom.Kind kind(char letter) {
    return switch (letter) {
      case 'm' -> UcumAtom.Kind.METRIC;
      case 's' -> UcumAtom.Kind.SCALE;
      case 'l' -> UcumAtom.Kind.LOGARITHM;
      default -> UcumAtom.Kind.PLAIN;
    };
  }
}
