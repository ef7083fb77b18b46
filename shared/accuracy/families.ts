import { capacities, spans } from './families/capacity.js';
import { healthy } from './families/healthy.js';
import { movements } from './families/movement.js';
import { operations } from './families/operation.js';
import { type Family } from './family.js';

export interface Chapter {
  readonly title: string;
  readonly families: readonly Family[];
}

export const chapters: readonly Chapter[] = [
  { title: 'Healthy valves', families: healthy },
  { title: 'Healthy valves by the travel they visit', families: spans },
  { title: 'Size, seat and signals', families: operations },
  { title: 'Capacity and characteristic', families: capacities },
  { title: 'Movement', families: movements },
];

export const families: readonly Family[] = chapters.flatMap((chapter) => chapter.families);
