/**
 * A cell of exactly `nx · ny · nz` ions in the rock salt arrangement, none on a face, so that
 * the block has as many ions as the cell. Spacing 2.106 Å.
 */
export function rockSaltCell(nx, ny, nz) {
  const spacing = 2.106;
  const sites = [];
  for (let i = 0; i < nx; i += 1) {
    for (let j = 0; j < ny; j += 1) {
      for (let k = 0; k < nz; k += 1) {
        const isCation = (i + j + k) % 2 === 0;
        const element = isCation ? 'Mg' : 'O';
        const chargeE = isCation ? 2 : -2;
        sites.push({
          definitionIndex: sites.length,
          label: `${element}${sites.length}`,
          copy: 0,
          fractional: [(i + 0.5) / nx, (j + 0.5) / ny, (k + 0.5) / nz],
          chargeE,
          element,
          components: [{ element, chargeE, occupancy: 1 }],
          speciesKey: isCation ? 'Mg+2' : 'O-2',
        });
      }
    }
  }
  const [a, b, c] = [nx * spacing, ny * spacing, nz * spacing];
  return {
    lattice: { aA: a, bA: b, cA: c, alphaDeg: 90, betaDeg: 90, gammaDeg: 90 },
    vectorsA: [a, 0, 0, 0, b, 0, 0, 0, c],
    volumeA3: a * b * c,
    sites,
    operationCount: 1,
    hasPolarAxis: false,
    parameters: {},
  };
}
