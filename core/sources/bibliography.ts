/**
 * The documents that rules, tables and checks may cite. A key that stands here compiles; any other does not, and neither
 * does a clause outside the chapters listed. `cited` is how the document is named in a citation where that is not its key.
 */
export interface Document {
  readonly title: string
  readonly edition: string
  readonly publisher: string
  readonly cited?: string
  /** First parts of a clause; one that is empty lets every clause text through. */
  readonly chapters: readonly string[]
}

export const DOCUMENTS = {
  'AISC 360-22': {
    title: 'Specification for Structural Steel Buildings, ANSI/AISC 360-22',
    edition: '2022',
    publisher: 'American Institute of Steel Construction',
    chapters: [
      ...['A3', 'B3', 'B4', 'Table B4.1a', 'Table B4.1b', 'C1', 'C2', 'D2', 'E1', 'E2', 'E3', 'E4', 'E5', 'E6', 'E7'],
      ...['F1', 'F2', 'F3', 'F4', 'F5', 'F6', 'F7', 'F8', 'F9', 'F10', 'F11', 'F12', 'F13', 'G1', 'G2', 'G3', 'G6'],
      ...['H1', 'H2', 'H3', 'J1', 'J2', 'J3', 'J4', 'J5', 'J7', 'J8', 'J10', 'L1', 'L2', 'L3', 'Table J2.4'],
      ...['App. 3', 'App. 6', 'App. 8'],
    ],
  },
  'ASCE 7-22': {
    title: 'Minimum Design Loads and Associated Criteria for Buildings and Other Structures, ASCE/SEI 7-22',
    edition: '2022',
    publisher: 'American Society of Civil Engineers',
    chapters: ['1.3', '2.2', '2.3', '2.4', '3.1', '4.3', '4.6', '4.9', 'C4.9', 'App. C'],
  },
  'AISC Manual': {
    title: 'Steel Construction Manual',
    edition: '16th ed., 2023',
    publisher: 'American Institute of Steel Construction',
    chapters: ['Part 1', 'Part 3', 'Part 9', 'Table 1-', 'Table 2-', 'Table 3-', 'Table 9-'],
  },
  'AISC Shapes Database': {
    title: 'Shapes Database',
    edition: 'v16.0, 2023',
    publisher: 'American Institute of Steel Construction',
    chapters: [''],
  },
  'AISC Design Guide 7': {
    title: 'Industrial Building Design, Steel Design Guide 7',
    edition: '3rd ed., 2019',
    publisher: 'American Institute of Steel Construction',
    chapters: [''],
  },
  'AISC Design Guide 9': {
    title: 'Torsional Analysis of Structural Steel Members, Steel Design Guide 9',
    edition: '1997',
    publisher: 'American Institute of Steel Construction',
    chapters: [''],
  },
  'CMAA 70': {
    title: 'Specifications for Top Running Bridge and Gantry Type Multiple Girder Electric Overhead Traveling Cranes',
    edition: '2010',
    publisher: 'Crane Manufacturers Association of America',
    chapters: ['70-1', '70-2', '70-3', '70-4', '1.', '2.', '3.', '4.'],
  },
  'AIST TR-13': {
    title: 'Guide for the Design and Construction of Mill Buildings, Technical Report 13',
    edition: '2021',
    publisher: 'Association for Iron and Steel Technology',
    chapters: ['1.', '2.', '3.', '4.', '5.', '6.', '7.'],
  },
  'ASTM A6': {
    title: 'General Requirements for Rolled Structural Steel Bars, Plates, Shapes, and Sheet Piling',
    edition: 'A6/A6M',
    publisher: 'ASTM International',
    chapters: [''],
  },
  'ASTM A36': {
    title: 'Carbon Structural Steel',
    edition: 'A36/A36M',
    publisher: 'ASTM International',
    chapters: [''],
  },
  'ASTM A572': {
    title: 'High-Strength Low-Alloy Columbium-Vanadium Structural Steel',
    edition: 'A572/A572M',
    publisher: 'ASTM International',
    chapters: [''],
  },
  'ASTM A588': {
    title:
      'High-Strength Low-Alloy Structural Steel, up to 50 ksi Minimum Yield Point, with Atmospheric Corrosion Resistance',
    edition: 'A588/A588M',
    publisher: 'ASTM International',
    chapters: [''],
  },
  'ASTM A709': {
    title: 'Structural Steel for Bridges',
    edition: 'A709/A709M',
    publisher: 'ASTM International',
    chapters: [''],
  },
  'ASTM A913': {
    title: 'High-Strength Low-Alloy Steel Shapes of Structural Quality, Produced by Quenching and Self-Tempering',
    edition: 'A913/A913M',
    publisher: 'ASTM International',
    chapters: [''],
  },
  'ASTM A992': {
    title: 'Structural Steel Shapes',
    edition: 'A992/A992M',
    publisher: 'ASTM International',
    chapters: [''],
  },
  'ASTM A759': {
    title: 'Carbon Steel Crane Rails',
    edition: 'A759',
    publisher: 'ASTM International',
    chapters: [''],
  },
  practice: {
    title: 'Common practice of the trade, no document',
    edition: '',
    publisher: '',
    cited: 'common practice',
    chapters: [''],
  },
  statics: {
    title: 'Statics and strength of materials, no document',
    edition: '',
    publisher: '',
    chapters: [''],
  },
} as const satisfies Record<string, Document>

export type DocumentKey = keyof typeof DOCUMENTS

type Listed<D extends DocumentKey> = (typeof DOCUMENTS)[D]['chapters'][number]

/** The chapters of a document that may be cited; of one that lists an empty chapter, any words. */
export type ChapterOf<D extends DocumentKey> = '' extends Listed<D> ? string : Listed<D>
