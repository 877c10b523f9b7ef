import { describeTopic, type Topic } from '@/lib/demonstration/topics/topic';

export const coastTopics: Topic[] = [
  describeTopic('managed-realignment', 'coast', [1.1, 2013, 10], ['marsh-erosion', 'wave-vegetation', 'flood-risk'], {
    subjects: 'realignment sites|breached embankments|restored salt marshes|creek networks|former polders|set-back sea walls|regulated tidal exchange schemes|pioneer saltmarsh plants',
    processes: 'sedimentation|creek development|plant colonisation|drainage evolution|soil consolidation|carbon burial|tidal exchange|habitat creation',
    drivers: 'breach width|site elevation|agricultural legacy|sediment supply|tidal asymmetry|creek excavation|sea-level rise|compensation policy',
    settings: 'macrotidal estuaries|estuary margins|embanked coasts|reclaimed marshes|barrier coasts|fine-grained shores|tidal rivers',
    methods: 'lidar differencing|sediment plates|marker horizons|cost-benefit analysis|tidal-prism models|vegetation quadrats',
  }),
  describeTopic('wave-vegetation', 'coast', [1.2, 2016, 9], ['marsh-erosion', 'breakwaters', 'managed-realignment'], {
    subjects: 'flexible stems|seagrass meadows|marsh canopies|kelp forests|mangrove roots|artificial vegetation mimics|Spartina canopies|willow hedges',
    processes: 'wave attenuation|drag|stem breakage|turbulence production|wave-current interaction|energy dissipation|canopy bending|setup reduction',
    drivers: 'storm surge|stem stiffness|canopy submergence|seasonal dieback|wave steepness|opposing currents|biomass density|leaf reconfiguration',
    settings: 'large-scale flumes|sheltered bays|fronting marshes|shallow foreshores|delta shores|wave basins|vegetated dikes',
    methods: 'physical modelling|particle image velocimetry|phase-resolving wave models|pressure-sensor transects|drag-coefficient fitting|smoothed particle hydrodynamics',
  }),
  describeTopic('marsh-erosion', 'coast', [1.1, 2009, 13], ['managed-realignment', 'wave-vegetation', 'sediment-transport'], {
    subjects: 'saltmarsh cliffs|marsh edges|tidal flats|marsh scarps|mudflat profiles|vegetated platforms|cohesive banks|ponded marsh interiors',
    processes: 'lateral retreat|vertical accretion|toppling failure|undercutting|edge erosion|marsh drowning|root reinforcement|pond expansion',
    drivers: 'wind-wave exposure|suspended sediment deficit|crab burrowing|eutrophication|soil shear strength|boat wakes|tidal-flat lowering|storm sequences',
    settings: 'microtidal lagoons|open-coast marshes|back-barrier marshes|estuarine shores|muddy embayments|island marshes|fetch-limited bays',
    methods: 'historical maps|erosion pins|cosmic-ray sediment dating|wave-power indices|cohesive-strength meters|terrestrial laser scanning',
  }),
  describeTopic('dune-dynamics', 'coast', [1, 2002, 15], ['tidal-inlets', 'sediment-transport', 'remote-sensing'], {
    subjects: 'coastal foredunes|embryo dunes|blowouts|parabolic dunes|marram grass tussocks|beach-dune systems|dune slacks|aeolian sand sheets',
    processes: 'aeolian transport|foredune growth|scarp recovery|dune migration|vegetation burial|sand trapping|overwash|dune erosion',
    drivers: 'beach width|onshore wind|marram planting|storm clustering|beach nourishment|recreational trampling|groundwater level|rabbit grazing',
    settings: 'sandy coasts|barrier islands|prograding beaches|nourished beaches|dissipative beaches|dune reserves|spit systems',
    methods: 'sand traps|cellular automata|airborne lidar|optically stimulated luminescence|sonic anemometers|profile surveys',
  }),
  describeTopic('tidal-inlets', 'coast', [0.9, 1997, 13], ['sediment-transport', 'dune-dynamics', 'breakwaters'], {
    subjects: 'tidal inlets|ebb-tidal deltas|inlet channels|multiple-inlet systems|tidal basins|flood-tidal deltas|spit tips|migrating shoals',
    processes: 'channel migration|inlet closure|shoal bypassing|cross-sectional stability|ebb dominance|morphological equilibrium|breaching|basin infilling',
    drivers: 'tidal prism|longshore drift|basin closure|jetty construction|dredging|wave asymmetry|river discharge|basin geometry',
    settings: 'mixed-energy coasts|barrier lagoons|Wadden-type basins|wave-dominated coasts|navigation entrances|island chains|small estuaries',
    methods: 'process-based morphodynamic models|bathymetric charts|stability diagrams|empirical equilibrium relations|moored current meters|aggregated models',
  }),
  describeTopic('sediment-transport', 'coast', [1.2, 1999, 20], ['tidal-inlets', 'marsh-erosion', 'breakwaters'], {
    subjects: 'graded sands|sheet-flow layers|ripple fields|sand-mud mixtures|suspended loads|swash zones|gravel beaches|bedload particles',
    processes: 'bedload transport|sediment suspension|ripple migration|hindered settling|grain sorting|near-bed turbulence|phase lag|flocculation',
    drivers: 'wave skewness|breaking waves|bed shear stress|mud content|undertow|current-wave angle|particle shape|infiltration',
    settings: 'oscillating water tunnels|surf zones|tidal channels|shoreface sands|shelf seas|laboratory flumes|macrotidal beaches',
    methods: 'acoustic backscatter profiling|two-phase flow models|optical backscatter sensors|tracer sand|bed-level sensors|large-eddy simulation',
  }),
  describeTopic('breakwaters', 'coast', [0.9, 1994, 14], ['wave-vegetation', 'sediment-transport', 'flood-risk'], {
    subjects: 'rubble-mound breakwaters|armour units|low-crested structures|caisson breakwaters|vertical walls|rock revetments|crown walls|dike slopes',
    processes: 'wave overtopping|armour stability|toe scour|wave transmission|impulsive loading|run-up|settlement|damage progression',
    drivers: 'wave obliquity|armour porosity|crest freeboard|long-period swell|core permeability|construction tolerance|foreshore slope|storm duration',
    settings: 'harbour entrances|depth-limited conditions|wave flumes|exposed coasts|marina basins|composite slopes|port extensions',
    methods: 'scale-model tests|neural-network prediction|probabilistic design|pressure transducers|volume-of-fluid simulation|joint-probability analysis',
  }),
];
