import { type FindingRule } from './finding-rule.js';

/** Flow through the valve is choked a good part of the time (methods.md §9.2); flashing hours are shown apart. */
export const chokedService: FindingRule = {
  kind: 'Choked service',
  weight: 1,
  explains: [],
  measure({ service, pressureDrop }, _sheet, limits) {
    if (service === null) return [];
    if (service.chokedShare === null) return service.reason ?? [];
    return [
      {
        ...limits.findings.kinds['Choked service'],
        x: service.chokedShare,
        rule: 'choked',
        standardError: null,
        holds: true,
        severityFactor: 1,
        rests: { onPosition: false, onPressures: pressureDrop === 'modelled' },
        evidence: {
          chokedShare: service.chokedShare,
          nearChokedShare: service.nearChokedShare,
          flashingHours: service.flashingHours,
          medianCavitationIndex: service.medianCavitationIndex,
        },
      },
    ];
  },
};
