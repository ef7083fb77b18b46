import { type Candidate, proposeBinding } from './propose-bindings.js';

const aValve = (tag: string, ...roles: ('flow' | 'position')[]): Candidate => ({
  id: tag,
  tag,
  roles: new Set(roles),
});

describe('a proposed binding', () => {
  it('takes the valve whose tag the historian tag begins with, and the role its ending says', () => {
    const found = proposeBinding('FV-101.OP', [aValve('FV-10'), aValve('FV-101')]);
    expect(found).toMatchObject({ valve: { tag: 'FV-101' }, role: 'demand' });
  });

  it('finds a transmitter by the number it shares with one valve', () => {
    expect(proposeBinding('FT-207', [aValve('FV-207'), aValve('FV-208')])).toMatchObject({
      valve: { tag: 'FV-207' },
      role: 'flow',
    });
  });

  it('proposes nothing where two valves are as near', () => {
    expect(proposeBinding('FT-207', [aValve('FV-207'), aValve('LV-207')])).toBeNull();
  });

  it('proposes nothing for a role that is taken', () => {
    expect(proposeBinding('FT-207', [aValve('FV-207', 'flow')])).toBeNull();
  });

  it('proposes nothing where the name says no role', () => {
    expect(proposeBinding('XQ-207', [aValve('FV-207')])).toBeNull();
  });
});
