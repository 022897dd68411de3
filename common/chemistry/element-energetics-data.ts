/**
 * Enthalpies and energies of free atoms, kJ mol⁻¹; entries read `element value …`. Each list has one
 * source and one standing, named in `element-energetics.ts`, where they are read.
 */

/** Enthalpies of atomisation at 298.15 K, per mole of atoms. */
export const atomisationRead = `
Li 159.3; Na 107.5; K 89.0; Rb 80.9; Cs 76.5; Be 324.0; Mg 147.1; Ca 177.8; Sr 164.4; Ba 180.0;
Al 330.0; Ag 284.9; Zn 130.4; Cd 111.8; Cu 337.4; Pb 195.2; Ti 473.0; Mn 280.7; Fe 416.3;
Tl 182.2; F 79.4; Cl 121.3; Br 111.9; I 106.8; O 249.2`;

/** The same, from memory: CODATA key values (B, C, P, S, Si, Ge, Sn, Hg, Th, U) and handbook values. */
export const atomisationRemembered = `
B 565; C 716.7; P 316.5; S 277.2; Si 450; Ge 372; Sn 301.2; Hg 61.4; Th 602; U 533; Sc 377.8;
V 514.2; Cr 396.6; Co 424.7; Ni 429.7; Ga 277; Se 227.1; Te 196.7; Y 421.3; Zr 608.8; Nb 725.9;
In 243.3; La 431; Ce 423; Hf 619.2`;

/** Bond dissociation enthalpies of diatomic molecules at 298.15 K, the molecules as gases. */
export const bondRead = `
H2 436.0; N2 944.87; O2 498.46; F2 158.75; Cl2 242.6; Br2 192.82; I2 151.1`;

/** Enthalpies of gaining the first electron: negative where energy is released. */
export const firstAffinityRead = `
H -72.769; Li -59.6327; O -140.976; F -328.1649; Na -52.867; Al -41.762; S -200.4101;
Cl -348.575; K -48.383; Ca -2.37; Cu -119.235; Se -194.9587; Br -324.5371; Rb -46.884; Sr -5.023;
I -295.153`;

/** Successive ionisation energies, first to fourth as far as known. */
export const ionisationRead = `
Li 520.2 7298.1 11815.0; Be 899.5 1757.1 14848.7 21006.6; B 800.6 2427.1 3659.7 25025.8;
O 1313.9 3388.3 5300.5 7469.2; F 1681.0 3374.2 6050.4 8407.7; Na 495.8 4562 6910.3 9543;
Mg 737.7 1450.7 7732.7 10542.5; Al 577.5 1816.7 2744.8 11577; Si 786.5 1577.1 3231.6 4355.5;
Cl 1251.2 2298 3822 5158.6; K 418.8 3052 4420 5877; Ca 589.8 1145.4 4912.4 6491`;

/** The same, seen in one table only. */
export const ionisationSeenOnce = `
Rb 403 2633 3860 5080; Cs 375.7 2234.3 3400; Sr 549.5 1064.2 4138 5500; Ba 502.9 965.2 3600;
Sc 633.1 1235 2388.6 7090.6; Ti 658.8 1309.8 2652.5 4174.6; V 650.9 1414 2830 4507;
Cr 652.9 1590.6 2987 4743; Mn 717.3 1509 3248 4940; Fe 762.5 1561.9 2957 5290;
Co 760.4 1648 3232 4950; Ni 737.1 1753 3395 5300; Cu 745.5 1957.9 3555 5536;
Zn 906.4 1733.3 3833 5731; Ga 578.8 1979.3 2963 6180; Y 600 1180 1980 5847;
Zr 640.1 1270 2218 3313; Nb 652.1 1380 2416 3700; Ag 731 2070 3361; Cd 867.8 1631.4 3616;
In 558.3 1820.7 2704 5210; Sn 708.6 1411.8 2943 3930.3; La 538.1 1067 1850.3 4819;
Ce 534.4 1050 1949 3547; Hf 658.5 1440 2250 3216; Pb 715.6 1450.5 3081.5 4083;
Tl 589.4 1971 2878; U 597.6 1420; Th 587 1110 1930 2780`;

/** The same, from memory. */
export const ionisationRemembered = `
H 1312; C 1086.5 2352.6 4620.5 6222.7; Ge 762 1537.5 3302.1 4411; Hg 1007.1 1810 3300; Bi 703 1610 2466 4370`;
