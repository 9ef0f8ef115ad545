import type { Role } from '@shared/model/people';

export const DEPARTMENTS = {
  ULT: 'Ultrafast Science',
  SQG: 'Spectroscopy and Quantum Gases',
  MAT: 'Materials Processing',
  PDS: 'Photonic Devices and Sensing',
  BIO: 'Life Imaging',
} as const;
export type DepartmentCode = keyof typeof DEPARTMENTS;

export interface DemoPerson {
  readonly name: string;
  readonly department?: DepartmentCode;
  readonly role?: Role;
  /** For namesakes. */
  readonly email?: string;
  /** Days before today on which the person left. */
  readonly leftDaysAgo?: number;
}

/** The people of the demo institute. Everybody is invented. */
// prettier-ignore
export const DEMO_PEOPLE = {
  P01: { name: 'Ilse Brandmoor', role: 'lso' },
  P02: { name: 'Kofi Asantewell', department: 'SQG', role: 'deputy-lso' },
  P03: { name: 'Marisol Quintavar', department: 'MAT', role: 'deputy-lso' },
  P04: { name: 'Teodor Lindqvarn', role: 'administrator' },
  P05: { name: 'Hanae Morishiba', role: 'auditor' },
  P06: { name: 'Rosalind Achterveld' },
  P07: { name: 'Baraka Ndolimu', role: 'committee' },
  P08: { name: 'Siobhan Derravane' },
  P09: { name: 'Anouk Fellmeer', role: 'occupational-health' },
  P10: { name: 'Emeka Obiluwa', role: 'interlock-technician' },
  P11: { name: 'Lucja Zarembowa', role: 'purchasing' },
  P12: { name: 'Nils Havrebeck', role: 'personnel' },
  P13: { name: 'Yevgenia Sokolanova', department: 'ULT', role: 'department-head' },
  P14: { name: 'Tariq Benhaloud', department: 'SQG', role: 'department-head' },
  P15: { name: 'Greta Ostervang', department: 'MAT', role: 'department-head' },
  P16: { name: 'Oluchi Nwabekere', department: 'BIO', role: 'department-head' },
  P17: { name: 'Renzo Castelmaro', department: 'PDS', role: 'department-head' },
  P18: { name: 'Aiko Tanabeshi', department: 'ULT', role: 'laser-supervisor' },
  P19: { name: 'Dmitri Volkhansky', department: 'ULT', role: 'laser-supervisor', leftDaysAgo: 6 },
  P20: { name: 'Fatou Diallomey', department: 'ULT', role: 'laser-supervisor' },
  P21: { name: 'Leif Arnmarken', department: 'SQG', role: 'laser-supervisor' },
  P22: { name: 'Shirin Golestanpur', department: 'SQG', role: 'laser-supervisor' },
  P23: { name: 'Mateus Ferranova', department: 'SQG', role: 'laser-supervisor' },
  P24: { name: 'Brunhild Keppelmark', department: 'MAT', role: 'laser-supervisor' },
  P25: { name: 'Chidi Ekwuluma', department: 'MAT', role: 'laser-supervisor' },
  P26: { name: 'Soo-ah Namgoryeo', department: 'PDS', role: 'laser-supervisor' },
  P27: { name: 'Ravi Chandrasol', department: 'PDS', role: 'laser-supervisor' },
  P28: { name: 'Elif Karadenli', department: 'BIO', role: 'laser-supervisor' },
  P29: { name: 'Wyatt Thornbrooke', department: 'BIO', role: 'laser-supervisor' },
  P30: { name: 'Noor Hadiqani', department: 'ULT', role: 'operator' },
  P31: { name: 'Pekka Rautalampinen', department: 'ULT', role: 'operator' },
  P32: { name: 'Thandiwe Mokgolane', department: 'ULT', role: 'operator' },
  P33: { name: 'Ximena Corralvez', department: 'SQG', role: 'operator' },
  P34: { name: 'Bogdan Ionescaru', department: 'SQG', role: 'operator' },
  P35: { name: 'Keahi Palakiko-Moan', department: 'SQG', role: 'operator' },
  P36: { name: 'Saoirse Dunnavale', department: 'SQG', role: 'operator' },
  P37: { name: 'Jun-seo Bakhwan', department: 'SQG', role: 'operator' },
  P38: { name: 'Amélie Courtevigne', department: 'ULT', role: 'operator' },
  P39: { name: 'Farid Rahmanzai', department: 'MAT', role: 'operator' },
  P40: { name: 'Anna Vesterlind', department: 'MAT', role: 'operator', email: 'anna.vesterlind-mat@halvermere.example' },
  P41: { name: 'Anna Vesterlind', department: 'PDS', role: 'operator', email: 'anna.vesterlind-pds@halvermere.example' },
  P42: { name: 'Ngozi Adeyinwa', department: 'MAT', role: 'operator' },
  P43: { name: 'Hemi Tauranui', department: 'MAT', role: 'operator' },
  P44: { name: 'Lotte van Dijkeren', department: 'BIO', role: 'operator' },
  P45: { name: 'Yusuf Kalkandere', department: 'BIO', role: 'operator' },
  P46: { name: 'Inés Abelardona', department: 'BIO', role: 'operator' },
  P47: { name: 'Tove Skarholm', department: 'BIO', role: 'operator' },
  P48: { name: 'Dakota Wrenfield', department: 'BIO', role: 'operator' },
  P49: { name: 'Minh Châu Trandoan', department: 'PDS', role: 'operator' },
  P50: { name: 'Olumide Fashanure', department: 'PDS', role: 'operator' },
  P51: { name: 'Katarzyna Wolniewska', department: 'PDS', role: 'operator' },
  P52: { name: 'Arjun Meenakshan', department: 'ULT', role: 'operator' },
  P53: { name: 'Zsófia Halmosvári', department: 'ULT', role: 'operator' },
  P54: { name: 'Caoimhe Brannelly', department: 'ULT', role: 'operator' },
  P55: { name: 'Tomás Irigoyenar', department: 'ULT', role: 'operator' },
  P56: { name: 'Lindiwe Khumasi', department: 'SQG', role: 'operator', leftDaysAgo: 30 },
  P57: { name: 'Einar Blákollur', department: 'MAT', role: 'operator' },
  P58: { name: 'Parisa Nourabad', department: 'BIO', role: 'operator' },
  P59: { name: 'Zdenka Hroudnova', role: 'operator' },
  P60: { name: 'Casimir Oylewick' },
} as const satisfies Record<string, DemoPerson>;

export type DemoPersonId = keyof typeof DEMO_PEOPLE;
