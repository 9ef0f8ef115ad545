import type { DemoPersonId, DepartmentCode } from './demo-people';

export interface DemoArea {
  readonly code: string;
  readonly name: string;
  readonly building: string;
  readonly department: DepartmentCode;
  readonly supervisor: DemoPersonId;
  readonly alternate?: DemoPersonId;
  /** Absent where the beam goes into the open. */
  readonly wallDistanceM?: number;
  readonly phone: string;
  readonly note?: string;
}

// prettier-ignore
export const DEMO_AREAS: readonly DemoArea[] = [
  { code: 'A-101', name: 'Ultrafast lab', building: 'Building A', department: 'ULT', supervisor: 'P18', alternate: 'P30', wallDistanceM: 9.5, phone: '555-0111' },
  { code: 'A-102', name: 'Pulse annex', building: 'Building A', department: 'ULT', supervisor: 'P19', wallDistanceM: 7.2, phone: '555-0112', note: 'Also fed by a split beam from A-101.' },
  { code: 'A-110', name: 'Teaching and alignment lab', building: 'Building A', department: 'ULT', supervisor: 'P20', alternate: 'P18', wallDistanceM: 8, phone: '555-0113' },
  { code: 'B-203', name: 'Tunable spectroscopy', building: 'Building B', department: 'SQG', supervisor: 'P21', alternate: 'P33', wallDistanceM: 11, phone: '555-0121' },
  { code: 'B-204', name: 'Cold atoms', building: 'Building B', department: 'SQG', supervisor: 'P22', alternate: 'P34', wallDistanceM: 8.4, phone: '555-0122' },
  { code: 'B-210', name: 'Raman room', building: 'Building B', department: 'SQG', supervisor: 'P23', alternate: 'P22', wallDistanceM: 5.6, phone: '555-0123' },
  { code: 'C-005', name: 'Processing hall', building: 'Building C', department: 'MAT', supervisor: 'P24', alternate: 'P25', wallDistanceM: 24, phone: '555-0131', note: 'Basement; no network.' },
  { code: 'C-006', name: 'Micro-machining', building: 'Building C', department: 'MAT', supervisor: 'P25', alternate: 'P24', wallDistanceM: 6.5, phone: '555-0132' },
  { code: 'C-012', name: 'Fiber lab', building: 'Building C', department: 'PDS', supervisor: 'P26', alternate: 'P27', wallDistanceM: 7.8, phone: '555-0133' },
  { code: 'D-301', name: 'Bio-imaging', building: 'Building D', department: 'BIO', supervisor: 'P28', alternate: 'P44', wallDistanceM: 6.2, phone: '555-0141' },
  { code: 'D-305', name: 'Device clean room', building: 'Building D', department: 'PDS', supervisor: 'P27', alternate: 'P26', wallDistanceM: 12.4, phone: '555-0142' },
  { code: 'PC-1', name: 'Lidar hut and open sky', building: 'Port Callow outstation', department: 'BIO', supervisor: 'P29', alternate: 'P28', phone: '555-0151', note: 'The beam goes into the sky: no wall ends it.' },
];
