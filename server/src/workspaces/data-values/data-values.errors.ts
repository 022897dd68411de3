import { readDataKey, valueFault, type DataKey } from '#common/chemistry/data-key';
import { errorCodes } from '#common/errors/error-codes';
import { Problem } from '#common/errors/problem';

/** @throws {Problem} `data.key` */
export function assertDataKey(key: string): DataKey {
  const read = readDataKey(key);
  if (read === null) {
    const message = errorCodes['data.key'][1];
    throw new Problem('data.key', message, {
      fields: [{ code: 'data.key', field: 'key', message }],
    });
  }
  return read;
}

/** @throws {Problem} `data.value` */
export function assertDataValue({ facts }: DataKey, value: number): void {
  const message = valueFault(facts, value);
  if (message !== null) {
    throw new Problem('data.value', message, {
      fields: [{ code: 'data.value', field: 'value', message }],
    });
  }
}
