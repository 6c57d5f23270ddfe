import { describe, expect, it } from 'vitest';
import { formatCitation } from '#src/lib/citation.ts';

const blank = { authors: null, year: null, title: null, container: null, volume: null, page: null };

describe('a citation in one line', () => {
  it('names authors, journal, volume, page and year', () => {
    const callaway = {
      ...blank,
      authors: 'J. Callaway',
      year: 1959,
      title: 'Model for Lattice Thermal Conductivity at Low Temperatures',
      container: 'Physical Review',
      volume: '113',
      page: '1046',
    };
    expect(formatCitation(callaway)).toBe('J. Callaway, Physical Review 113, 1046 (1959)');
  });

  it('gives a book its title', () => {
    const book = {
      ...blank,
      authors: 'C. Kittel',
      year: 1996,
      title: 'Introduction to Solid State Physics',
      container: 'Wiley',
    };
    expect(formatCitation(book)).toBe('C. Kittel, Introduction to Solid State Physics, Wiley (1996)');
  });

  it('separates several authors with commas', () => {
    const two = {
      ...blank,
      authors: 'C. J. Glassbrenner; G. A. Slack',
      year: 1964,
      container: 'Physical Review',
      volume: '134',
    };
    expect(formatCitation(two)).toBe('C. J. Glassbrenner, G. A. Slack, Physical Review 134 (1964)');
  });

  it('leaves no stray punctuation where something is not known', () => {
    expect(formatCitation({ ...blank, title: 'Acoustic properties of solids' })).toBe(
      'Acoustic properties of solids',
    );
    expect(formatCitation({ ...blank, year: 1956 })).toBe('1956');
    expect(formatCitation(blank)).toBe('');
  });
});
