/** Shown wherever a screen, a mail or a page on paper could lead to work on a valve (methods.md §11). */
export const shortCaution =
  'Inferred from operating history. It does not replace inspection or a sizing calculation. Do not stroke, isolate, bypass, re-tune or open this valve on this evidence alone. Follow site permit, management-of-change and local codes; decisions belong to qualified, where required licensed, engineers.';

export const tripCaution =
  'Safety-instrumented or trip duty: not ranked, no tuning advice, no trim proposal. Testing, bypass and modification follow the functional safety plan of the site.';
