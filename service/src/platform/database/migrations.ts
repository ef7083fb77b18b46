import { CreatePeople1764600000000 } from './migrations/1764600000000-create-people.js';
import { CreateAudit1764600000001 } from './migrations/1764600000001-create-audit.js';
import { CreateValves1764600000002 } from './migrations/1764600000002-create-valves.js';
import { CreateTrends1764600000003 } from './migrations/1764600000003-create-trends.js';
import { CreateAssessments1764600000004 } from './migrations/1764600000004-create-assessments.js';

/** Every change of the schema, oldest first. One that has landed is never edited. */
export const migrations = [
  CreatePeople1764600000000,
  CreateAudit1764600000001,
  CreateValves1764600000002,
  CreateTrends1764600000003,
  CreateAssessments1764600000004,
];
