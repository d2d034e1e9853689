import type { Source } from '../finding';

/** Loading as the CDC guideline has it; the wording was read in a course and in review notes that restate it. */
export const cdcLoading: Source = {
  text: 'CDC guideline for disinfection and sterilization in healthcare facilities (2008), loading, as restated by a continuing-education course and technician review notes.',
  provenance: 'restated',
};

export const cdcMonitoring: Source = {
  text: 'CDC guideline for disinfection and sterilization in healthcare facilities (2008), monitoring recommendations (read in a copy).',
  provenance: 'published',
};

export const racgpLoading: Source = {
  text: 'RACGP infection prevention and control guidelines, section 10, loading.',
  provenance: 'published',
};

export const generalPractice: Source = {
  text: 'Several operator manuals and guides agree; general practice, no single standard.',
  provenance: 'common-practice',
};

export const commonPractice: Source = { text: 'Common practice, no source.', provenance: 'common-practice' };

export const houseRule: Source = { text: 'House rule of this facility.', provenance: 'house-rule' };

export const equipment: Source = {
  text: 'The limit of the equipment, as entered by this facility.',
  provenance: 'house-rule',
};

export const instructions: Source = { text: 'The item’s instructions for use.', provenance: 'ifu' };

export const njMonitoring: Source = {
  text: 'New Jersey Administrative Code 8:43G-8.8.',
  provenance: 'published',
};

export const accountability: Source = {
  text: 'A load record lists its specific contents: New Jersey Administrative Code 8:43G-8.11(f); RACGP guidelines, section 10, documenting. That listed, scanned and counted agree is our own rule.',
  provenance: 'published',
};

export const drawing: Source = {
  text: 'Our own check: a load can only be judged from data that make sense.',
  provenance: 'house-rule',
};
