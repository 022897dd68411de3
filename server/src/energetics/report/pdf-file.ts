import { StreamableFile } from '@nestjs/common';

import type { LatticeReport } from '#common/schemas/report';

/** A file name any system takes: letters, digits and hyphens. */
function fileName({ title, revision }: LatticeReport): string {
  const plain = title
    .normalize('NFKD')
    .replace(/[^A-Za-z0-9]+/g, '-')
    .replace(/^-|-$/g, '')
    .toLowerCase();
  return `${plain === '' ? 'lattice' : plain}-revision-${revision}.pdf`;
}

/** The bytes as a download, named after the lattice. */
export function pdfFile(bytes: Buffer, report: LatticeReport): StreamableFile {
  return new StreamableFile(bytes, {
    type: 'application/pdf',
    disposition: `attachment; filename="${fileName(report)}"`,
    length: bytes.length,
  });
}
