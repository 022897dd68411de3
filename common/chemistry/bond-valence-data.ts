/**
 * Bond-valence parameters R₀ in Å by anion and cation, `cation=R₀`; b is 0.37 Å for all of them.
 * One list for each source.
 */

/** I. D. Brown and D. Altermatt, Acta Cryst. B41 (1985) 244–247. */
export const brownAltermattData = `
O-2: Li+1=1.466 Na+1=1.803 K+1=2.132 Rb+1=2.263 Cs+1=2.417 Be+2=1.381 Mg+2=1.693 Ca+2=1.967
Sr+2=2.118 Ba+2=2.285 B+3=1.371 P+5=1.617 S+6=1.624 C+4=1.39 N+5=1.432 Ti+4=1.815 Zr+4=1.928
V+5=1.803 Nb+5=1.911 Cr+3=1.724 Mn+2=1.79 Mn+4=1.753 Fe+2=1.734 Fe+3=1.759 Co+2=1.692 Cu+2=1.679
Zn+2=1.704 Y+3=2.019 La+3=2.172 Sn+4=1.905 Ag+1=1.842; F-1: Li+1=1.36 Na+1=1.677 K+1=1.992
Mg+2=1.578 Ca+2=1.842 Al+3=1.545 Ba+2=2.188; Cl-1: K+1=2.519 Cs+1=2.791 Cd+2=2.212; S-2:
Cd+2=2.304 Pb+2=2.541`;

/** N. E. Brese and M. O'Keeffe, Acta Cryst. B47 (1991) 192–197. */
export const breseOKeeffeData = `
O-2: Si+4=1.624 Hf+4=1.923 Ce+4=2.028 U+4=2.112; Cl-1: Li+1=1.91 Na+1=2.15 Ca+2=2.37 Ag+1=2.09;
Br-1: K+1=2.66 Ag+1=2.22; S-2: Zn+2=2.09; N-3: Al+3=1.79 Ga+3=1.84`;

/** From memory, after the same two papers: parameters of everyday salts the lists above lack. */
export const rememberedBondValenceData = `
O-2: Al+3=1.651 Ga+3=1.73 Ti+3=1.791 Ni+2=1.654 Cu+1=1.593 Pb+2=2.112; F-1: Rb+1=2.16 Cs+1=2.33
Sr+2=2.019 Cd+2=1.811; Cl-1: Rb+1=2.65 Mg+2=2.08 Sr+2=2.51 Ba+2=2.69; Br-1: Li+1=2.02 Na+1=2.33
Rb+1=2.78 Cs+1=2.95; I-1: Li+1=2.22 Na+1=2.54 K+1=2.88 Rb+1=3.01 Cs+1=3.18 Ag+1=2.38`;
