export { demonstrationPeople } from '@/lib/demonstration/accounts';
export { generateDemonstration, type Demonstration, type DemonstrationFile, type DemonstrationPortfolio, type DemonstrationTruth } from '@/lib/demonstration/generate';
export { type DemonstrationUnit } from '@/lib/demonstration/portfolios';
export { generateScale, type ScaleRequest } from '@/lib/demonstration/scale';
export { type DemonstrationStatistics, type FileStatistics } from '@/lib/demonstration/statistics';
