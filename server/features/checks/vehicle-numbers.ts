import { checkVin } from '#shared/vin.ts';

/** A rebuild's vehicle number as it stands in the books. */
export interface NumberedVehicle {
  readonly id: string;
  readonly vin: string;
}

/** A number whose check digit does not fit, and one that would, if a likely slip explains it. */
export interface NumberFault {
  readonly id: string;
  readonly text: string;
}

/** Numbers that do not check (definitions §14). A warning only: the check digit is a duty in North America alone. */
export function numberFaults(vehicles: readonly NumberedVehicle[]): NumberFault[] {
  return vehicles.flatMap(({ id, vin }) => {
    const { isValid, suggestions } = checkVin(vin);
    if (isValid) return [];
    const [likely] = suggestions;
    return [{ id, text: likely === undefined ? vin : `${vin}, perhaps ${likely}` }];
  });
}

/** Rebuilds of one vehicle number: all but the first of each, with the first beside it. */
export function sameVehicle(vehicles: readonly NumberedVehicle[]): { id: string; firstId: string; vin: string }[] {
  const first = new Map<string, string>();
  return vehicles.flatMap(({ id, vin }) => {
    const number = vin.trim().toUpperCase();
    const firstId = first.get(number);
    if (firstId === undefined) first.set(number, id);
    return firstId === undefined ? [] : [{ id, firstId, vin: number }];
  });
}
