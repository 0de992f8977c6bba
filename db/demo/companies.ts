import { type SupplierBody, type SiteBody } from './demo-bodies';

/** The maker of the demo, invented. */
export const DEMO_SITE: SiteBody = {
  name: 'Hollowmere Controls',
  department: 'Incoming inspection',
  address: '14 Sluice Lane, Hollowmere',
  engineeringList: ['engineering@hollowmere.example'],
  waitingTargetHours: 8,
  approveOwnPlans: false,
  releaseOwnReadings: false,
  dailyChecks: false,
};

/** Its suppliers, invented. */
export const DEMO_SUPPLIERS: readonly SupplierBody[] = [
  {
    code: 'KES',
    name: 'Kestrin Power',
    address: 'Unit 6, Furrow Yard\nKestrin Quay',
    contactName: 'D. Hallgarth',
    contactEmail: 'quality@kestrin-power.example',
    active: true,
  },
  {
    code: 'BAL',
    name: 'Baltree Electronics',
    address: '210 Old Kiln Road\nBaltree',
    contactName: 'S. Ponsaro',
    contactEmail: 'complaints@baltree.example',
    active: true,
  },
  {
    code: 'OMD',
    name: 'Omdal Vik Supply',
    address: 'Brygga 9\nOmdal Vik',
    contactName: 'A. Fjeldre',
    contactEmail: 'kvalitet@omdal-vik.example',
    active: true,
  },
];
