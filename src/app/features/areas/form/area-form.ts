import type { NonNullableFormBuilder } from '@angular/forms';
import { type Area, type AreaInput, areaInputSchema } from '@shared/model/areas';

import { zodValidator } from '../../../ui/field/zod-validator';

const { shape } = areaInputSchema;

export type AreaForm = ReturnType<typeof areaForm>;

/** The fields of an area, filled from one that exists. */
export function areaForm(fb: NonNullableFormBuilder, area?: Area) {
  return fb.group({
    code: [area?.code ?? '', zodValidator(shape.code)],
    name: [area?.name ?? '', zodValidator(shape.name)],
    building: [area?.building ?? '', zodValidator(shape.building)],
    room: [area?.room ?? '', zodValidator(shape.room)],
    department: [area?.department ?? '', zodValidator(shape.department)],
    supervisorId: [area?.supervisorId ?? ''],
    alternateId: [area?.alternateId ?? ''],
    wallDistanceM: fb.control<{ value: number; text: string } | null>(
      area?.wallDistanceM ? { value: area.wallDistanceM, text: `${area.wallDistanceM} m` } : null,
    ),
    phone: [area?.phone ?? '', zodValidator(shape.phone)],
    note: [area?.note ?? '', zodValidator(shape.note)],
  });
}

/** What the form holds, in the shape of the contract and not yet checked by it. */
export function areaValue(form: AreaForm): object {
  const { wallDistanceM, ...rest } = form.getRawValue();
  return { ...rest, wallDistanceM: wallDistanceM?.value };
}

/** The part of a stored area that can be changed. */
export function areaInput(area: Area): AreaInput {
  const known = Object.keys(shape) as (keyof AreaInput)[];
  return Object.fromEntries(known.map((name) => [name, area[name]])) as AreaInput;
}
