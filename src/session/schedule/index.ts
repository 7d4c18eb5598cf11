export { SCHEDULE_COLUMNS } from './columns.ts';
export { type Broken, CsvReader, type CsvRecord, csvLine, LONGEST_RECORD } from './csv-records.ts';
export { guarded } from './guard.ts';
export { readScheduleHead, type ScheduleHead } from './head.ts';
export { type RowRead, readScheduleRow } from './row.ts';
export { type ScheduleTable, scheduleOf } from './write-row.ts';
