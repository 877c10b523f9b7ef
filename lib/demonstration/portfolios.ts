import { firstYear, lastYear } from '@/lib/demonstration/catalogue';
import { type Owner } from '@/lib/demonstration/topics';

export interface DemonstrationUnit {
  key: string;
  name: string;
  kind: 'institution' | 'faculty' | 'department';
  /** Parents come before their children. */
  parentKey: string | null;
}

export const units: DemonstrationUnit[] = [
  { key: 'tarnholm', name: 'Tarnholm University', kind: 'institution', parentKey: null },
  { key: 'water-and-land', name: 'Faculty of Water and Land', kind: 'faculty', parentKey: 'tarnholm' },
  { key: 'freshwater-ecology', name: 'Freshwater Ecology', kind: 'department', parentKey: 'water-and-land' },
  { key: 'peat-and-soil-science', name: 'Peat and Soil Science', kind: 'department', parentKey: 'water-and-land' },
  { key: 'coastal-engineering', name: 'Coastal Engineering', kind: 'department', parentKey: 'water-and-land' },
];

export interface PortfolioFrame {
  key: string;
  owner: Owner;
  name: string;
  unitKey: string;
  description: string;
  periodFrom: number;
  periodTo: number;
}

const period = { periodFrom: firstYear, periodTo: lastYear };

/** In the order in which they are to be taken in: what the faculty's lists repeat is catalogued by then. */
export const portfolioFrames: PortfolioFrame[] = [
  { key: 'demonstration-freshwater', owner: 'freshwater', name: 'Freshwater Ecology', unitKey: 'freshwater-ecology', description: 'Works of the department on rivers, lakes and reed beds. Invented for the demonstration.', ...period },
  { key: 'demonstration-peat', owner: 'peat', name: 'Peat and Soil Science', unitKey: 'peat-and-soil-science', description: 'Works of the department on peat, soils and mires. Invented for the demonstration.', ...period },
  { key: 'demonstration-coast', owner: 'coast', name: 'Coastal Engineering', unitKey: 'coastal-engineering', description: 'Works of the department on shores, waves and sediment. Invented for the demonstration.', ...period },
  { key: 'demonstration-faculty', owner: 'faculty', name: 'Faculty of Water and Land', unitKey: 'water-and-land', description: 'Joint works of the departments, and those of their works that the faculty lists. Invented for the demonstration.', ...period },
];
