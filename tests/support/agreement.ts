/** Agreement of two answers by definitions §17: what counts or is cents exactly, the rest within its tolerance. */

const T_AND_POOLING = ['t_lo', 't_hi', 'sd', 'v', 'lambda', 'sp2', 'Q', 'tau2', 'mu', 'se_mu', 'mu_lo', 'mu_hi'];
const LOOSE = new Set([...T_AND_POOLING, 'shrunk', 'shrunk_se', 'shrunk_lo', 'shrunk_hi']);

/** Every place where `actual` differs from `expected`, missing and additional keys included; empty = they agree. */
export function differences(actual: unknown, expected: unknown, path = ''): string[] {
  if (Array.isArray(expected) || Array.isArray(actual)) return listDifferences(actual, expected, path);
  if (isObject(expected) && isObject(actual)) {
    const keys = new Set([...Object.keys(expected), ...Object.keys(actual)]);
    return [...keys].flatMap((key) => {
      const at = `${path}.${key}`;
      if (!(key in expected)) return [`${at}: not in the reference`];
      return key in actual ? differences(actual[key], expected[key], at) : [`${at}: missing`];
    });
  }
  return agree(actual, expected, path) ? [] : [`${path}: ${String(actual)} should be ${String(expected)}`];
}

function listDifferences(actual: unknown, expected: unknown, path: string): string[] {
  if (!Array.isArray(expected) || !Array.isArray(actual)) return [`${path}: one of the two is no list`];
  if (actual.length !== expected.length) return [`${path}: ${actual.length} items should be ${expected.length}`];
  return expected.flatMap((item, i) => differences(actual[i], item, `${path}[${i}]`));
}

function agree(actual: unknown, expected: unknown, path: string): boolean {
  if (typeof actual !== 'number' || typeof expected !== 'number') return actual === expected;
  const key = path.split('.').at(-1) ?? '';
  const gap = Math.abs(actual - expected);
  if (path.includes('xirr')) return gap <= 1e-7 * (1 + Math.abs(expected));
  if (key === 'p') return gap <= 1e-6 * Math.abs(expected);
  if (Number.isInteger(expected) && Number.isInteger(actual)) return gap === 0;
  return gap <= (LOOSE.has(key) ? 1e-8 : 1e-9) * Math.max(1, Math.abs(expected));
}

function isObject(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null;
}
