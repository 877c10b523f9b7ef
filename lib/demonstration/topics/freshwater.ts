import { describeTopic, type Topic } from '@/lib/demonstration/topics/topic';

export const freshwaterTopics: Topic[] = [
  describeTopic('stream-invertebrates', 'freshwater', [1.5, 2003, 22], ['river-restoration', 'stream-drying', 'diatoms'], {
    subjects: 'mayfly nymphs|stonefly larvae|caddisfly assemblages|benthic macroinvertebrates|chironomid larvae|freshwater shrimps|riffle invertebrates|blackfly populations|shredder guilds|macroinvertebrate communities',
    processes: 'recolonisation|secondary production|emergence|downstream drift|feeding|dispersal|taxonomic turnover|life-history variation',
    drivers: 'acid episodes|fine sediment|conifer afforestation|insecticide pulses|summer low flow|leaf litter supply|organic enrichment|metal contamination',
    settings: 'upland streams|chalk rivers|headwater catchments|gravel-bed rivers|moorland becks|lowland brooks|spring-fed streams',
    methods: 'kick sampling|Surber sampling|emergence traps|stable isotopes|family-level biotic scores|drift nets',
  }),
  describeTopic('reed-bed-nutrients', 'freshwater', [1.2, 2008, 12], ['river-restoration', 'paludiculture', 'catchment-carbon'], {
    subjects: 'reed beds|treatment wetlands|Phragmites stands|bulrush stands|vegetated filter strips|surface-flow wetlands|rhizome mats|wetland buffer zones|emergent macrophytes',
    processes: 'nitrate removal|phosphorus retention|denitrification|ammonium uptake|nutrient storage|plug-flow hydraulics|clogging|harvest yield',
    drivers: 'hydraulic loading|dairy effluent|winter harvesting|retention time|storm pulses|plant age|tile drainage|carbon dosing',
    settings: 'agricultural catchments|sewage works|farm wetlands|lake inflows|polder margins|constructed cells|riparian zones',
    methods: 'tracer tests|nitrogen-15 enrichment|mass balances|gravel-bed microcosms|porewater samplers|acetylene block assays',
  }),
  describeTopic('river-restoration', 'freshwater', [1.2, 2014, 10], ['stream-invertebrates', 'fish-passage', 'flood-risk'], {
    subjects: 'restored reaches|re-meandered channels|gravel bars|large wood jams|riparian corridors|reconnected floodplains|side channels|river habitats|straightened channels',
    processes: 'geomorphic recovery|habitat diversification|channel adjustment|bed coarsening|hydraulic complexity|planform change|community response|appraisal',
    drivers: 'weir removal|bank reprofiling|wood placement|floodplain reconnection|gravel augmentation|flow restoration|public consultation|legacy sediment',
    settings: 'lowland rivers|urban streams|degraded rivers|low-gradient reaches|wandering rivers|rural catchments|post-industrial valleys',
    methods: 'before-after-control-impact designs|repeat bathymetry|drone photogrammetry|habitat mapping|expert elicitation|two-dimensional hydraulic models',
  }),
  describeTopic('lake-stratification', 'freshwater', [1.1, 2006, 24], ['diatoms', 'catchment-carbon', 'stream-invertebrates'], {
    subjects: 'stratified lakes|hypolimnetic waters|small reservoirs|dimictic lakes|surface mixed layers|phytoplankton blooms|cyanobacterial scums|deep chlorophyll layers|kettle lakes',
    processes: 'thermal stratification|oxygen depletion|internal loading|spring overturn|heat storage|vertical mixing|ice-off timing|bloom formation',
    drivers: 'summer heatwaves|wind sheltering|water-colour change|phosphorus enrichment|ice loss|artificial aeration|basin morphometry|atmospheric stilling',
    settings: 'temperate lakes|glacial lakes|drinking-water reservoirs|shallow meres|mountain tarns|humic lakes|eutrophic basins',
    methods: 'thermistor chains|one-dimensional lake models|high-frequency buoys|eddy covariance over water|oxygen optodes|satellite surface temperatures',
  }),
  describeTopic('fish-passage', 'freshwater', [1, 2012, 12], ['river-restoration', 'stream-drying', 'stream-invertebrates'], {
    subjects: 'Atlantic salmon smolts|sea trout|European eels|river lampreys|cyprinid fishes|upstream migrants|nature-like fishways|vertical-slot fishways|downstream migrants',
    processes: 'passage efficiency|attraction|swimming performance|migration delay|entrainment|spawning migration|fallback|survival',
    drivers: 'tailwater turbulence|hydropower turbines|weir height|water temperature|attraction flow|trash-rack spacing|night-time pumping|predator density',
    settings: 'regulated rivers|low-head weirs|pumping stations|tidal barrages|hydropower intakes|fragmented catchments|estuary sluices',
    methods: 'PIT telemetry|acoustic tracking|sonar imaging|flume trials|mark-recapture models|energetics modelling',
  }),
  describeTopic('diatoms', 'freshwater', [1, 1998, 13], ['lake-stratification', 'stream-invertebrates', 'testate-amoebae'], {
    subjects: 'benthic diatoms|epilithic biofilms|planktonic diatoms|sedimentary diatom records|diatom frustules|periphyton mats|Achnanthidium populations|diatom assemblages',
    processes: 'species turnover|valve deformation|silica uptake|colonisation|inferred acidification|palaeolimnological reconstruction|biofilm growth|substrate preference',
    drivers: 'pH decline|nutrient enrichment|silica limitation|light availability|grazing snails|conductivity|liming|herbicide exposure',
    settings: 'acidified lakes|stony streams|sediment cores|littoral zones|soft-water lochs|canals|reference rivers',
    methods: 'weighted-averaging transfer functions|artificial substrates|scanning electron microscopy|DNA metabarcoding|lead-210 chronologies|trophic indices',
  }),
  describeTopic('stream-drying', 'freshwater', [0.8, 2021, 7], ['stream-invertebrates', 'fish-passage', 'flood-risk'], {
    subjects: 'intermittent streams|dry stream beds|refuge pools|winterbourne channels|resting stages|drying networks|temporary ponds|stranded biota',
    processes: 'flow cessation|rewetting|persistence|connectivity loss|desiccation resistance|pool contraction|leaf decomposition|resilience',
    drivers: 'groundwater abstraction|supraseasonal drought|drying duration|rewetting pulses|riparian shade|bed permeability|climate warming|water transfer',
    settings: 'karst catchments|chalk winterbournes|mediterranean streams|perched aquifers|abstracted rivers|sandy lowlands|headwater networks',
    methods: 'citizen flow logs|time-lapse cameras|temperature loggers|environmental DNA|rehydration experiments|network simulation',
  }),
];
