/** Every call of the HTTP API. Routes are mounted from this table and nothing else. */
import { accountEndpoints } from './accounts.ts';
import { activityEndpoints } from './activity.ts';
import { boxEndpoints } from './boxes.ts';
import { healthEndpoints } from './health.ts';
import { holdEndpoints } from './holds.ts';
import { householdEndpoints } from './households.ts';
import { paperEndpoints } from './papers.ts';
import { readingQualityEndpoints } from './reading-quality.ts';
import { calendarEndpoints, reminderEndpoints } from './reminders.ts';
import { ruleTableEndpoints } from './rule-tables.ts';
import { scanEndpoints } from './scans.ts';
import { sessionEndpoints } from './sessions.ts';
import { shredListEndpoints } from './shred-lists.ts';
import { subjectEndpoints } from './subjects.ts';

export const endpoints = {
  ...sessionEndpoints,
  ...accountEndpoints,
  ...householdEndpoints,
  ...boxEndpoints,
  ...scanEndpoints,
  ...paperEndpoints,
  ...readingQualityEndpoints,
  ...holdEndpoints,
  ...subjectEndpoints,
  ...shredListEndpoints,
  ...reminderEndpoints,
  ...calendarEndpoints,
  ...activityEndpoints,
  ...ruleTableEndpoints,
  ...healthEndpoints,
};
export type EndpointName = keyof typeof endpoints;
