/** Points between writes at which a test lets the process die, to show that nothing is kept half. */
export const killPointNames = [
  'submit:revision-written',
  'submit:rows-written',
  'decide:decision-written',
  'decide:records-written',
  'fits:computed',
  'fits:stored',
  'freeze:rows-written',
  'freeze:fits-written',
  'freeze:files-stored',
  'freeze:before-switch',
] as const;
