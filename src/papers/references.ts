/**
 * @module The literature behind the methods, by prescription and by model. Identifiers as the pages of docs/methods/ have
 * them; titles are left to the reader's own bibliography, which completes an entry from its identifier.
 */

export interface Reference {
  /** Key for \cite. */
  readonly key: string;
  readonly authors: readonly string[];
  readonly year: string;
  readonly journal?: string;
  readonly volume?: string;
  readonly pages?: string;
  /** arXiv identifier, old or new. */
  readonly eprint?: string;
  readonly book?: string;
}

const REFERENCES = {
  dingle: {
    key: 'Dingle:1973',
    authors: ['Dingle, R. B.'],
    year: '1973',
    book: 'Asymptotic Expansions: Their Derivation and Interpretation',
  },
  berryHowls: {
    key: 'Berry:1990',
    authors: ['Berry, M. V.', 'Howls, C. J.'],
    year: '1990',
    journal: 'Proc. R. Soc. Lond. A',
    volume: '430',
    pages: '653',
  },
  ayala: {
    key: 'Ayala:2019',
    authors: ['Ayala, C.', 'Lobregat, X.', 'Pineda, A.'],
    year: '2019',
    eprint: '1902.07736',
  },
  bakerGravesMorris: {
    key: 'Baker:1996',
    authors: ['Baker, G. A.', 'Graves-Morris, P.'],
    year: '1996',
    book: 'Padé Approximants',
  },
  beneke: {
    key: 'Beneke:1999',
    authors: ['Beneke, M.'],
    year: '1999',
    journal: 'Phys. Rept.',
    volume: '317',
    pages: '1',
    eprint: 'hep-ph/9807443',
  },
  benekeJamin: {
    key: 'Beneke:2008',
    authors: ['Beneke, M.', 'Jamin, M.'],
    year: '2008',
    journal: 'JHEP',
    volume: '09',
    pages: '044',
    eprint: '0806.3156',
  },
  boito: { key: 'Boito:2018', authors: ['Boito, D.', 'Masjuan, P.', 'Oliani, F.'], year: '2018', eprint: '1807.01567' },
  capriniFischer: {
    key: 'Caprini:1999',
    authors: ['Caprini, I.', 'Fischer, J.'],
    year: '1999',
    eprint: 'hep-ph/9811367',
  },
  ciulliFischer: {
    key: 'Ciulli:1961',
    authors: ['Ciulli, S.', 'Fischer, J.'],
    year: '1961',
    journal: 'Nucl. Phys.',
    volume: '24',
    pages: '465',
  },
  wynn: {
    key: 'Wynn:1956',
    authors: ['Wynn, P.'],
    year: '1956',
    journal: 'Math. Tables Aids Comput.',
    volume: '10',
    pages: '91',
  },
  levin: {
    key: 'Levin:1973',
    authors: ['Levin, D.'],
    year: '1973',
    journal: 'Int. J. Comput. Math. B',
    volume: '3',
    pages: '371',
  },
  weniger: {
    key: 'Weniger:1989',
    authors: ['Weniger, E. J.'],
    year: '1989',
    journal: 'Comput. Phys. Rep.',
    volume: '10',
    pages: '189',
    eprint: 'math/0306302',
  },
  grunberg: {
    key: 'Grunberg:1984',
    authors: ['Grunberg, G.'],
    year: '1984',
    journal: 'Phys. Rev. D',
    volume: '29',
    pages: '2315',
  },
  stevenson: {
    key: 'Stevenson:1981',
    authors: ['Stevenson, P. M.'],
    year: '1981',
    journal: 'Phys. Rev. D',
    volume: '23',
    pages: '2916',
  },
  blm: {
    key: 'Brodsky:1983',
    authors: ['Brodsky, S. J.', 'Lepage, G. P.', 'Mackenzie, P. B.'],
    year: '1983',
    journal: 'Phys. Rev. D',
    volume: '28',
    pages: '228',
  },
  mera: {
    key: 'Mera:2015',
    authors: ['Mera, H.', 'Pedersen, T. G.', 'Nikolić, B. K.'],
    year: '2015',
    journal: 'Phys. Rev. Lett.',
    volume: '115',
    pages: '143001',
    eprint: '1405.7956',
  },
  seznec: {
    key: 'Seznec:1979',
    authors: ['Seznec, R.', 'Zinn-Justin, J.'],
    year: '1979',
    journal: 'J. Math. Phys.',
    volume: '20',
    pages: '1398',
  },
  cacciari: { key: 'Cacciari:2011', authors: ['Cacciari, M.', 'Houdeau, N.'], year: '2011', eprint: '1105.5152' },
  bagnaschi: {
    key: 'Bagnaschi:2014',
    authors: ['Bagnaschi, E.', 'Cacciari, M.', 'Guffanti, A.', 'Jenniches, L.'],
    year: '2014',
    eprint: '1409.5036',
  },
  bonvini: { key: 'Bonvini:2020', authors: ['Bonvini, M.'], year: '2020', eprint: '2006.16293' },
  duhr: {
    key: 'Duhr:2021',
    authors: ['Duhr, C.', 'Huss, A.', 'Mazeliauskas, A.', 'Szafron, R.'],
    year: '2021',
    eprint: '2106.04585',
  },
  pineda: { key: 'Pineda:2001', authors: ['Pineda, A.'], year: '2001', eprint: 'hep-ph/0105008' },
  komijani: { key: 'Komijani:2017', authors: ['Komijani, J.'], year: '2017', eprint: '1701.00347' },
  mrs: {
    key: 'Brambilla:2017',
    authors: ['Brambilla, N.', 'Komijani, J.', 'Kronfeld, A. S.', 'Vairo, A.'],
    year: '2017',
    eprint: '1712.04983',
  },
  msr: {
    key: 'Hoang:2017',
    authors: ['Hoang, A. H.', 'Jain, A.', 'Lepenik, C.', 'Mateu, V.', 'Preisser, M.', 'Scimemi, I.', 'Stewart, I. W.'],
    year: '2017',
    eprint: '1704.01580',
  },
  ps: { key: 'Beneke:1998', authors: ['Beneke, M.'], year: '1998', eprint: 'hep-ph/9804241' },
  kinetic: {
    key: 'Czarnecki:1997',
    authors: ['Czarnecki, A.', 'Melnikov, K.', 'Uraltsev, N.'],
    year: '1997',
    eprint: 'hep-ph/9708372',
  },
  bmns: {
    key: 'Beneke:2016',
    authors: ['Beneke, M.', 'Marquard, P.', 'Nason, P.', 'Steinhauser, M.'],
    year: '2016',
    eprint: '1605.03609',
  },
  fiveLoops: {
    key: 'Baikov:2016',
    authors: ['Baikov, P. A.', 'Chetyrkin, K. G.', 'Kühn, J. H.'],
    year: '2016',
    eprint: '1606.08659',
  },
  decoupling: {
    key: 'Chetyrkin:1997',
    authors: ['Chetyrkin, K. G.', 'Kniehl, B. A.', 'Steinhauser, M.'],
    year: '1997',
    eprint: 'hep-ph/9708255',
  },
  decoupling4: {
    key: 'Schroder:2005',
    authors: ['Schröder, Y.', 'Steinhauser, M.'],
    year: '2005',
    eprint: 'hep-ph/0512058',
  },
  flag: { key: 'FLAG:2024', authors: ['{Flavour Lattice Averaging Group}'], year: '2024', eprint: '2411.04268' },
  hoangRegner: { key: 'Hoang:2020', authors: ['Hoang, A. H.', 'Regner, C.'], year: '2020', eprint: '2008.00578' },
  golterman: {
    key: 'Golterman:2023',
    authors: ['Golterman, M.', 'Maltman, K.', 'Peris, S.'],
    year: '2023',
    eprint: '2305.10386',
  },
  benitez: {
    key: 'BenitezRathgeb:2022',
    authors: ['Benitez-Rathgeb, M. A.', 'Boito, D.', 'Hoang, A. H.', 'Jamin, M.'],
    year: '2022',
    eprint: '2202.10957',
  },
  dombSykes: {
    key: 'Domb:1957',
    authors: ['Domb, C.', 'Sykes, M. F.'],
    year: '1957',
    journal: 'Proc. R. Soc. Lond. A',
    volume: '240',
    pages: '214',
  },
} as const satisfies Readonly<Record<string, Reference>>;

type Name = keyof typeof REFERENCES;

/** By prescription and by truncation model. */
const OF_METHOD: Readonly<Record<string, readonly Name[]>> = {
  'least-term': ['dingle'],
  terminant: ['dingle', 'ayala'],
  hyperasymptotic: ['berryHowls'],
  pade: ['bakerGravesMorris'],
  'wynn-epsilon': ['wynn'],
  levin: ['levin', 'weniger'],
  'weniger-delta': ['weniger'],
  'borel-pade': ['bakerGravesMorris', 'beneke'],
  'borel-leroy-pade': ['bakerGravesMorris', 'beneke'],
  'borel-dlog': ['boito'],
  'borel-partial-pade': ['boito', 'beneke'],
  'borel-quadratic': ['bakerGravesMorris'],
  'borel-conformal': ['ciulliFischer', 'capriniFischer'],
  'singularity-model': ['benekeJamin'],
  'borel-hypergeometric': ['mera'],
  'order-dependent-map': ['seznec'],
  fac: ['grunberg'],
  pms: ['stevenson'],
  blm: ['blm'],
  'cacciari-houdeau': ['cacciari'],
  'modified-ch': ['bagnaschi'],
  'renormalon-ch': ['bagnaschi'],
  geometric: ['bonvini', 'duhr'],
  abc: ['duhr'],
  'scale-marginalised': ['duhr'],
  'scale-averaged': ['duhr'],
};

/** By command: what every result of it rests on. */
const OF_COMMAND: Readonly<Record<string, readonly Name[]>> = {
  assess: ['beneke', 'dombSykes'],
  growth: ['dombSykes'],
  plane: ['bakerGravesMorris'],
  compare: ['beneke'],
  evolve: ['fiveLoops', 'decoupling', 'decoupling4', 'flag'],
  mass: ['bmns', 'pineda', 'msr', 'mrs', 'ps', 'kinetic', 'komijani'],
  contour: ['benekeJamin', 'hoangRegner', 'golterman', 'benitez'],
  extract: ['beneke', 'flag'],
  bubbles: ['beneke'],
};

/** The references of a command and of the methods that took part, each once. */
export function referencesFor(command: string, methods: readonly string[]): Reference[] {
  const names = [...(OF_COMMAND[command] ?? []), ...methods.flatMap((method) => OF_METHOD[method] ?? [])];
  return [...new Set(names)].map((name) => REFERENCES[name]);
}
