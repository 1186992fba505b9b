/**
 * Every source by its key: what a row of the handbook, a constant or an `@source` line refers to.
 */
export const references: Readonly<Record<string, string>> = {
  Archinal2018:
    "B. A. Archinal et al. (2018), Report of the IAU Working Group on Cartographic Coordinates and Rotational Elements: 2015, Celest. Mech. Dyn. Astron. 130, 22.",
  Atreya1986:
    "S. K. Atreya (1986), Atmospheres and Ionospheres of the Outer Planets and their Satellites, Springer.",
  BanksKockarts1973: "P. M. Banks and G. Kockarts (1973), Aeronomy, Part B, Academic Press.",
  Bates1959:
    "D. R. Bates (1959), Some problems concerning the terrestrial atmosphere above about the 100 km level, Proc. R. Soc. London A 253, 451–462.",
  Blanc1908:
    "A. Blanc (1908), Recherches sur les mobilités des ions dans les gaz, J. Phys. Théor. Appl. 7, 825–839.",
  BratleyFox1988:
    "P. Bratley and B. L. Fox (1988), Algorithm 659: implementing Sobol's quasirandom sequence generator, ACM Trans. Math. Softw. 14, 88–100.",
  Brinkmann1970:
    "R. T. Brinkmann (1970), Departures from Jeans' escape rate for H and He in the Earth's atmosphere, Planet. Space Sci. 18, 449–478.",
  Broyden1965:
    "C. G. Broyden (1965), A class of methods for solving nonlinear simultaneous equations, Math. Comput. 19, 577–593.",
  CODATA2022:
    "E. Tiesinga, P. J. Mohr, D. B. Newell and B. N. Taylor (2024), The 2022 CODATA Recommended Values of the Fundamental Physical Constants (Web Version 9.0), National Institute of Standards and Technology.",
  CRCDiffusion:
    "CRC Handbook of Chemistry and Physics, table Diffusion in Gases, after Marrero and Mason (1972).",
  CatlingKasting2017:
    "D. C. Catling and J. F. Kasting (2017), Atmospheric Evolution on Inhabited and Lifeless Worlds, Cambridge University Press.",
  Chamberlain1963:
    "J. W. Chamberlain (1963), Planetary coronae and atmospheric evaporation, Planet. Space Sci. 11, 901–960.",
  ChamberlainCampbell1967:
    "J. W. Chamberlain and F. J. Campbell (1967), Rate of evaporation of a non-Maxwellian atmosphere, Astrophys. J. 149, 687–705.",
  ChamberlainHunten1987:
    "J. W. Chamberlain and D. M. Hunten (1987), Theory of Planetary Atmospheres, 2nd edition, Academic Press.",
  ChapmanCowling1970:
    "S. Chapman and T. G. Cowling (1970), The Mathematical Theory of Non-Uniform Gases, 3rd edition, Cambridge University Press.",
  Corless1996:
    "R. M. Corless, G. H. Gonnet, D. E. G. Hare, D. J. Jeffrey and D. E. Knuth (1996), On the Lambert W function, Adv. Comput. Math. 5, 329–359.",
  Cranmer2004:
    "S. R. Cranmer (2004), New views of the solar wind with the Lambert W function, Am. J. Phys. 72, 1397–1403.",
  DLMF: "F. W. J. Olver et al. (2010 and later), NIST Digital Library of Mathematical Functions, National Institute of Standards and Technology.",
  Dekker1971:
    "T. J. Dekker (1971), A floating-point technique for extending the available precision, Numer. Math. 18, 224–242.",
  Devroye1986: "L. Devroye (1986), Non-Uniform Random Variate Generation, Springer.",
  DowellJarratt1971:
    "M. Dowell and P. Jarratt (1971), A modified regula falsi method for computing the root of an equation, BIT 11, 168–174.",
  Erkaev2007:
    "N. V. Erkaev, Yu. N. Kulikov, H. Lammer, F. Selsis, D. Langmayr, G. F. Jaritz and H. K. Biernat (2007), Roche lobe effects on the atmospheric loss from “Hot Jupiters”, Astron. Astrophys. 472, 329–334.",
  FoxHac1997:
    "J. L. Fox and A. Hać (1997), Spectrum of hot O at the exobases of the terrestrial planets, J. Geophys. Res. 102, 24005–24011.",
  FreedmanDiaconis1981:
    "D. Freedman and P. Diaconis (1981), On the histogram as a density estimator: L2 theory, Z. Wahrscheinlichkeitstheorie verw. Gebiete 57, 453–476.",
  FritschCarlson1980:
    "F. N. Fritsch and R. E. Carlson (1980), Monotone piecewise cubic interpolation, SIAM J. Numer. Anal. 17, 238–246.",
  GRIMech3:
    "G. P. Smith et al. (1999), GRI-Mech 3.0, Gas Research Institute; Lennard-Jones parameters of its transport data.",
  GolubVanLoan2013:
    "G. H. Golub and C. F. Van Loan (2013), Matrix Computations, 4th edition, Johns Hopkins University Press.",
  Gougousi1997:
    "T. Gougousi, M. F. Golde and R. Johnsen (1997), Electron–ion recombination rate coefficient measurements in a flowing afterglow plasma, Chem. Phys. Lett. 265, 399–403.",
  Gustafsson1994:
    "K. Gustafsson (1994), Control-theoretic techniques for stepsize selection in implicit Runge-Kutta methods, ACM Trans. Math. Softw. 20, 496–517.",
  HairerNorsettWanner1993:
    "E. Hairer, S. P. Nørsett and G. Wanner (1993), Solving Ordinary Differential Equations I: Nonstiff Problems, 2nd edition, Springer.",
  HamiltonBurns1992:
    "D. P. Hamilton and J. A. Burns (1992), Orbital stability zones about asteroids. II. The destabilizing effects of eccentric orbits and of solar radiation, Icarus 96, 43–64.",
  Hu2015:
    "R. Hu, S. Seager and Y. L. Yung (2015), Helium atmospheres on warm Neptune- and sub-Neptune-sized exoplanets and applications to GJ 436b, Astrophys. J. 807, 8.",
  Hunten1973:
    "D. M. Hunten (1973), The escape of light gases from planetary atmospheres, J. Atmos. Sci. 30, 1481–1494.",
  HuntenPepinWalker1987:
    "D. M. Hunten, R. O. Pepin and J. C. G. Walker (1987), Mass fractionation in hydrodynamic escape, Icarus 69, 532–549.",
  HyndmanFan1996:
    "R. J. Hyndman and Y. Fan (1996), Sample quantiles in statistical packages, Am. Stat. 50, 361–365.",
  IAU1976:
    "International Astronomical Union (1976), System of Astronomical Constants: the Julian century of 36,525 days of 86,400 s.",
  IAU2012B2:
    "International Astronomical Union (2012), Resolution B2 on the re-definition of the astronomical unit of length.",
  IAU2015B3:
    "International Astronomical Union (2015), Resolution B3 on recommended nominal conversion constants for selected solar and planetary properties.",
  JPLElements:
    "E. M. Standish and J. G. Williams, Keplerian elements for approximate positions of the major planets (J2000), Jet Propulsion Laboratory.",
  JPLSatellites: "Planetary satellite mean elements, Jet Propulsion Laboratory, Solar System Dynamics.",
  Jeans1925: "J. H. Jeans (1925), The Dynamical Theory of Gases, 4th edition, Cambridge University Press.",
  JoeKuo2008:
    "S. Joe and F. Y. Kuo (2008), Constructing Sobol sequences with better two-dimensional projections, SIAM J. Sci. Comput. 30, 2635–2654.",
  Kella1997:
    "D. Kella, L. Vejby-Christensen, P. J. Johnson, H. B. Pedersen and L. H. Andersen (1997), The source of green light emission determined from a heavy-ion storage ring experiment, Science 276, 1530–1533.",
  MarreroMason1972:
    "T. R. Marrero and E. A. Mason (1972), Gaseous diffusion coefficients, J. Phys. Chem. Ref. Data 1, 3–118.",
  MasonMarrero1970:
    "E. A. Mason and T. R. Marrero (1970), The diffusion of atoms and molecules, Adv. At. Mol. Phys. 6, 155–232.",
  MehrBiondi1969:
    "F. J. Mehr and M. A. Biondi (1969), Electron temperature dependence of recombination of O2+ and N2+ ions with electrons, Phys. Rev. 181, 264–271.",
  Meija2016:
    "J. Meija et al. (2016), Atomic weights of the elements 2013 (IUPAC Technical Report), Pure Appl. Chem. 88, 265–291: conventional atomic weights.",
  Minzner1976:
    "R. A. Minzner et al. (1976), Defining constants, equations, and abbreviated tables of the 1975 U.S. Standard Atmosphere, NASA TR R-459.",
  Moses2000:
    "J. I. Moses, B. Bézard, E. Lellouch, G. R. Gladstone, H. Feuchtgruber and M. Allen (2000), Photochemistry of Saturn's atmosphere. I, Icarus 143, 244–298.",
  NSSDC: "D. R. Williams, Planetary Fact Sheets, NASA Space Science Data Coordinated Archive.",
  NaifGM:
    "NASA Navigation and Ancillary Information Facility, text kernel gm_de440: gravitational parameters.",
  NaifPCK: "NASA Navigation and Ancillary Information Facility, text kernels pck00010 and pck00011: radii.",
  Opik1963: "E. J. Öpik (1963), Selective escape of gases, Geophys. J. R. Astron. Soc. 7, 490–509.",
  OpikSinger1959:
    "E. J. Öpik and S. F. Singer (1959), Distribution of density in a planetary exosphere, Phys. Fluids 2, 653–655.",
  Owen1995:
    "A. B. Owen (1995), Randomly permuted (t, m, s)-nets and (t, s)-sequences, in Monte Carlo and Quasi-Monte Carlo Methods in Scientific Computing, Springer, 299–317.",
  Parker1958:
    "E. N. Parker (1958), Dynamics of the interplanetary gas and magnetic fields, Astrophys. J. 128, 664–676.",
  Pavlov2019:
    "A. V. Pavlov (2019), Surv. Geophys.: table of binary diffusion coefficients after Mason and Marrero (1970).",
  Peterson1998:
    "J. R. Peterson et al. (1998), Dissociative recombination and excitation of N2+: cross sections and product branching ratios, J. Chem. Phys. 108, 1978–1988.",
  Petrignani2005:
    "A. Petrignani, W. J. van der Zande, P. C. Cosby, F. Hellberg, R. D. Thomas and M. Larsson (2005), Vibrationally resolved rate coefficients and branching fractions in the dissociative recombination of O2+, J. Chem. Phys. 122, 014302.",
  Plischke2013:
    "E. Plischke, E. Borgonovo and C. L. Smith (2013), Global sensitivity measures from given data, Eur. J. Oper. Res. 226, 536–550.",
  Poling2001:
    "B. E. Poling, J. M. Prausnitz and J. P. O'Connell (2001), The Properties of Gases and Liquids, 5th edition, McGraw-Hill, Appendix B.",
  Prohaska2022:
    "T. Prohaska et al. (2022), Standard atomic weights of the elements 2021 (IUPAC Technical Report), Pure Appl. Chem. 94, 573–600.",
  Ribas2005:
    "I. Ribas, E. F. Guinan, M. Güdel and M. Audard (2005), Evolution of the solar activity over time and effects on planetary atmospheres. I. High-energy irradiances (1–1700 Å), Astrophys. J. 622, 680–694.",
  Rosati2003:
    "R. E. Rosati, R. Johnsen and M. F. Golde (2003), Absolute yields of CO(a′3Σ+, d3Δ, e3Σ−) + O from the dissociative recombination of CO2+ ions with electrons, J. Chem. Phys. 119, 11630–11635.",
  Rosen1998:
    "S. Rosén et al. (1998), Absolute cross sections and final-state distributions for dissociative recombination and excitation of CO+ (v = 0) using an ion storage ring, Phys. Rev. A 57, 4462–4471.",
  ShepherdLaframboise1981:
    "M. M. Shepherd and J. G. Laframboise (1981), Chebyshev approximation of (1 + 2x) exp(x²) erfc x in 0 ≤ x < ∞, Math. Comput. 36, 249–253.",
  Sobol1993:
    "I. M. Sobol (1993), Sensitivity estimates for nonlinear mathematical models, Math. Model. Comput. Exp. 1, 407–414.",
  Spearman1904:
    "C. Spearman (1904), The proof and measurement of association between two things, Am. J. Psychol. 15, 72–101.",
  TakahasiMori1974:
    "H. Takahasi and M. Mori (1974), Double exponential formulas for numerical integration, Publ. RIMS Kyoto Univ. 9, 721–741.",
  Tang1989:
    "P. T. P. Tang (1989), Table-driven implementation of the exponential function in IEEE floating-point arithmetic, ACM Trans. Math. Softw. 15, 144–157.",
  Tang1990:
    "P. T. P. Tang (1990), Table-driven implementation of the logarithm function in IEEE floating-point arithmetic, ACM Trans. Math. Softw. 16, 378–400.",
  USSA1976: "NOAA, NASA and USAF (1976), U.S. Standard Atmosphere, 1976, NOAA-S/T 76-1562.",
  VejbyChristensen1998:
    "L. Vejby-Christensen, D. Kella, H. B. Pedersen and L. H. Andersen (1998), Dissociative recombination of NO+, Phys. Rev. A 57, 3627–3634.",
  Volkov2011:
    "A. N. Volkov, R. E. Johnson, O. J. Tucker and J. T. Erwin (2011), Thermally driven atmospheric escape: transition from hydrodynamic to Jeans escape, Astrophys. J. Lett. 729, L24.",
  Wang2012:
    "M. Wang, G. Audi, A. H. Wapstra, F. G. Kondev, M. MacCormick, X. Xu and B. Pfeiffer (2012), The AME2012 atomic mass evaluation (II), Chin. Phys. C 36, 1603–2014.",
  Watson1981:
    "A. J. Watson, T. M. Donahue and J. C. G. Walker (1981), The dynamics of a rapidly escaping atmosphere: applications to the evolution of Earth and Venus, Icarus 48, 150–166.",
  Wichura1988:
    "M. J. Wichura (1988), Algorithm AS 241: the percentage points of the normal distribution, Appl. Stat. 37, 477–484.",
  ZahnleKasting1986:
    "K. J. Zahnle and J. F. Kasting (1986), Mass fractionation during transonic escape and implications for loss of water from Mars and Venus, Icarus 68, 462–480.",
  Zipf1980:
    "E. C. Zipf (1980), The dissociative recombination of vibrationally excited N2+ ions, Geophys. Res. Lett. 7, 645–648.",
};
