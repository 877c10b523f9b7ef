import { describe, expect, it } from 'vitest';

import { findDoi, isRor, normaliseArxiv, normaliseDoi, normaliseIsbn, normaliseIssn, normaliseOrcid, normalisePmcid, normalisePmid, normaliseRor } from '@/lib/bibliography/identifiers';

describe('ORCID (ISO 27729, ISO/IEC 7064 MOD 11-2)', () => {
  // 0000-0002-1825-0097: the registry's fictitious example person; all agree with python-stdnum 1.18 (iso7064.mod_11_2).
  it.each(['0000-0002-1825-0097', '0000-0002-1694-233X', '0000-0001-5000-0007', '0000-0003-5000-0001'])('accepts %s', (id) => {
    expect(normaliseOrcid(id)).toBe(id);
    expect(normaliseOrcid(`https://orcid.org/${id}`)).toBe(id);
    expect(normaliseOrcid(id.replaceAll('-', '').toLowerCase())).toBe(id);
  });

  // Rejected by python-stdnum 1.18: a wrong check character, two exchanged digits, a missing one.
  it.each(['0000-0002-1825-0098', '0000-0002-1852-0097', '0000-0002-1825-009'])('refuses %s', (id) => expect(normaliseOrcid(id)).toBeUndefined());
});

describe('ISSN (ISO 3297)', () => {
  // Computed and checked with python-stdnum 1.18 (issn).
  it.each(['0378-5955', '2049-3630', '0317-8471', '1050-124X', '0896-3207', '2434-561X', '0028-0836', '1751-1577'])('accepts %s', (id) => {
    expect(normaliseIssn(id)).toBe(id);
    expect(normaliseIssn(id.replace('-', '').toLowerCase())).toBe(id);
  });

  it.each(['0378-5956', '2049-3631', '0378-595', '10378-5955'])('refuses %s', (id) => expect(normaliseIssn(id)).toBeUndefined());

  it('catches every single wrong digit, as the standard promises', () => {
    const valid = '03785955';
    for (let at = 0; at < 8; at += 1) {
      for (let digit = 0; digit < 10; digit += 1) {
        const changed = valid.slice(0, at) + digit + valid.slice(at + 1);
        expect(normaliseIssn(changed) === undefined).toBe(changed !== valid);
      }
    }
  });
});

describe('ISBN (ISO 2108)', () => {
  // Computed and checked with python-stdnum 1.18 (isbn).
  it('accepts 13 digits and turns ten into thirteen', () => {
    expect(normaliseIsbn('9780306406157')).toBe('9780306406157');
    expect(normaliseIsbn('978-0-306-40615-7')).toBe('9780306406157');
    expect(normaliseIsbn('0306406152')).toBe('9780306406157');
    expect(normaliseIsbn('0-306-40615-2')).toBe('9780306406157');
    expect(normaliseIsbn('080442957X')).toBe('9780804429573');
  });

  it.each(['9780306406158', '0306406153', '0804429570', '97803064061577', '123'])('refuses %s', (id) => expect(normaliseIsbn(id)).toBeUndefined());
});

describe('ROR (Crockford base 32, ISO/IEC 7064 MOD 97-10)', () => {
  // Identifiers of real organisations; python-stdnum 1.18 (iso7064.mod_97_10) computes the same check digits.
  it.each(['03yrm5c26', '02mhbdp94', '05dxps055', '052gg0110', '042nb2s44', '03vek6s52', '00f54p054', '013meh722', '01an7q238', '02nr0ka47', '04wxnsj81'])('accepts %s', (id) => {
    expect(isRor(id)).toBe(true);
    expect(normaliseRor(`https://ror.org/${id.toUpperCase()}`)).toBe(id);
  });

  it.each(['03yrm5c27', '03yrm5c2', '13yrm5c26', '03yrl5c26'])('refuses %s', (id) => expect(isRor(id)).toBe(false));
});

describe('DOI (ISO 26324: no check digit, compared without case)', () => {
  it.each([
    ['https://doi.org/10.1000/ABC%2F1', '10.1000/abc/1'],
    ['doi:10.1000/XYZ.', '10.1000/xyz'],
    // A name of the serial-item standard (ANSI/NISO Z39.56): brackets, "<", ">" and ";" are its own.
    ['10.1002/(SICI)1097-4571(199704)48:4<320::AID-ASI4>3.0.CO;2-V', '10.1002/(sici)1097-4571(199704)48:4<320::aid-asi4>3.0.co;2-v'],
    ['http://dx.doi.org/10.1103/PhysRevE.69.026113', '10.1103/physreve.69.026113'],
    ['10.1016/0014-5793(81)80778-8', '10.1016/0014-5793(81)80778-8'],
    ['10.1000.10/123', '10.1000.10/123'],
    [' DOI: 10.1000/a) ', '10.1000/a'],
    ['10.1000/100%', '10.1000/100%'],
  ])('brings %s to %s', (text, doi) => expect(normaliseDoi(text)).toBe(doi));

  it.each(['10.1000', '10.1000/', '11.1000/x', '0.3778/j.issn.1002', '10.12/x', 'none', '', '%E0%A4%A'])('refuses "%s"', (text) => expect(normaliseDoi(text)).toBeUndefined());

  it('is its own normal form', () => {
    for (const text of ['https://doi.org/10.1000/ABC%2F1', '10.1002/(SICI)1097-4571(199704)48:4<320::AID-ASI4>3.0.CO;2-V', 'doi:10.1000/x,.']) {
      const doi = normaliseDoi(text) as string;
      expect(normaliseDoi(doi)).toBe(doi);
    }
  });

  it('is found in running text without what surrounds it', () => {
    expect(findDoi('Small H. (1973). J. 24, 265. doi:10.1002/asi.4630240406. PMID: 1')).toBe('10.1002/asi.4630240406');
    expect(findDoi('see (https://doi.org/10.1000/a(b)c), and')).toBe('10.1000/a(b)c');
    expect(findDoi('<a href="https://doi.org/10.1000/x">10.1000/x</a>')).toBe('10.1000/x');
    expect(findDoi('10.1000/x;10.1000/y')).toBe('10.1000/x');
    expect(findDoi('x 10.1002/(SICI)1097-4571(199704)48:4<320::AID-ASI4>3.0.CO;2-V y')).toBe('10.1002/(sici)1097-4571(199704)48:4<320::aid-asi4>3.0.co;2-v');
    expect(findDoi('pages 10.12-14/2')).toBeUndefined();
  });
});

describe('identifiers without check characters', () => {
  it('reads numbers of the biomedical index and its archive', () => {
    expect(normalisePmid('PMID: 15170338')).toBe('15170338');
    expect(normalisePmid('0')).toBeUndefined();
    expect(normalisePmid('15170338 or so')).toBeUndefined();
    expect(normalisePmcid('pmc0034567')).toBe('PMC34567');
  });

  it('reads both forms of preprint numbers and drops the version', () => {
    expect(normaliseArxiv('arXiv:2101.00001v2 [cs.DL]')).toBe('2101.00001');
    expect(normaliseArxiv('hep-th/9901001')).toBe('hep-th/9901001');
    expect(normaliseArxiv('10.1000/x')).toBeUndefined();
  });
});
