import type { NonNullableFormBuilder } from '@angular/forms';
import {
  type Person,
  type PersonInput,
  personInputSchema,
  ROLES,
  type Role,
} from '@shared/model/people';

import { zodValidator } from '../../../ui/field/zod-validator';

const { shape } = personInputSchema;

export type PersonForm = ReturnType<typeof personForm>;

/** The fields of a person, filled from one that exists. */
export function personForm(fb: NonNullableFormBuilder, person?: Person) {
  const held = (role: Role) => person?.roles.includes(role) ?? false;
  return fb.group({
    name: [person?.name ?? '', zodValidator(shape.name)],
    email: [person?.email ?? '', zodValidator(shape.email)],
    department: [person?.department ?? '', zodValidator(shape.department)],
    roles: fb.record(Object.fromEntries(ROLES.map((role) => [role, held(role)]))),
    active: [person?.active ?? true],
  });
}

/** What the form holds, in the shape of the contract and not yet checked by it. */
export function personValue(form: PersonForm): object {
  const { roles, ...rest } = form.getRawValue();
  return { ...rest, roles: ROLES.filter((role) => roles[role]) };
}

/** The part of a stored person that can be changed. */
export function personInput({ name, email, department, roles, active }: Person): PersonInput {
  return { name, email, department, roles, active };
}
