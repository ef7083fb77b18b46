import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import { type AssessmentPage, type StoredAssessment } from '@tailrace/shared/contracts/assessments';
import { type FindingPage } from '@tailrace/shared/contracts/findings';
import { type Valve, type ValvePage, type ValveQuery } from '@tailrace/shared/contracts/valves';
import { api } from '../../lib/api-client';

const of = (tag: string) => `/valves/${encodeURIComponent(tag)}`;

export const valvesQuery = (query: Partial<ValveQuery>) =>
  queryOptions({
    queryKey: ['valves', 'page', query],
    queryFn: ({ signal }) => api.get<ValvePage>('/valves', { query, signal }),
    placeholderData: keepPreviousData,
  });

export const valveQuery = (tag: string) =>
  queryOptions({
    queryKey: ['valves', 'one', tag],
    queryFn: ({ signal }) => api.get<Valve>(of(tag), { signal }),
  });

export const assessmentsQuery = (tag: string) =>
  queryOptions({
    queryKey: ['assessments', 'of', tag],
    queryFn: ({ signal }) => api.get<AssessmentPage>(`${of(tag)}/assessments`, { signal }),
  });

/** The latest assessment of a valve, or the one chosen. */
export const assessmentQuery = (tag: string, id: string | undefined) =>
  queryOptions({
    queryKey: ['assessments', 'one', tag, id ?? 'latest'],
    queryFn: ({ signal }) =>
      api.get<StoredAssessment>(id ? `/assessments/${id}` : `${of(tag)}/assessment`, { signal }),
  });

export const findingsOfValveQuery = (tag: string) =>
  queryOptions({
    queryKey: ['findings', 'of', tag],
    queryFn: ({ signal }) => api.get<FindingPage>(`${of(tag)}/findings`, { signal }),
  });
