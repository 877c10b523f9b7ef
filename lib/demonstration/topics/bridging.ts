import { describeTopic, type Topic } from '@/lib/demonstration/topics/topic';

/** Topics in which departments meet; their works belong to the faculty. */
export const bridgingTopics: Topic[] = [
  describeTopic('flood-risk', 'faculty', [1.1, 2014, 11], ['river-restoration', 'managed-realignment', 'peat-hydrology'], {
    subjects: 'flood-prone communities|flood embankments|compound floods|natural flood measures|floodplain households|flood damages|catchment flood models|warning systems',
    processes: 'risk assessment|peak attenuation|economic appraisal|failure probability|hazard mapping|adaptation|attribution|insurance uptake',
    drivers: 'storm-tide coincidence|upland land use|urban expansion|river embanking|leaky barriers|climate projections|early warning|asset deterioration',
    settings: 'estuary towns|lowland catchments|delta cities|rural floodplains|peat-dominated headwaters|tidal reaches|small river basins',
    methods: 'ensemble hydraulic models|damage curves|household surveys|extreme-value statistics|agent-based simulation|radar rainfall',
  }),
  describeTopic('wetland-gases', 'faculty', [0.9, 2019, 8], ['drained-peat-carbon', 'reed-bed-nutrients', 'marsh-erosion'], {
    subjects: 'methane fluxes|rewetted wetlands|greenhouse-gas budgets|nitrous oxide hotspots|aerenchymatous plants|methanotroph communities|brackish marshes|ditch emissions',
    processes: 'ebullition|methane oxidation|plant-mediated transport|annual balance|sulphate inhibition|spatial upscaling|diffusive exchange|radiative forcing',
    drivers: 'salinity|shallow inundation|mowing|water-level rise|sulphate supply|temperature extremes|fresh litter|air-pressure drops',
    settings: 'coastal wetlands|rewetted fens|brackish reed beds|peat ditches|nutrient-rich fens|saltmarsh soils|flooded meadows',
    methods: 'floating chambers|laser spectroscopy|pore-gas samplers|microbial gene counts|process-based wetland models|bubble traps',
  }),
  describeTopic('catchment-carbon', 'faculty', [0.9, 2008, 11], ['lake-stratification', 'peat-hydrology', 'soil-respiration'], {
    subjects: 'dissolved organic carbon exports|humic waters|carbon-rich streams|particulate carbon loads|headwater carbon budgets|brown-water lakes|organic matter pools|estuarine carbon sinks',
    processes: 'browning|photomineralisation|carbon export|in-stream processing|flocculation in estuaries|aquatic degassing|water-colour generation|source apportionment',
    drivers: 'sulphur recovery|storm events|moorland burning|peat erosion|afforestation|autumn flushing|treatment chlorination|glacial legacy',
    settings: 'peat-covered catchments|boreal streams|water-supply catchments|river-lake networks|river-estuary continua|nested catchments|moorland reservoirs',
    methods: 'fluorescence spectroscopy|high-frequency sondes|radiocarbon of organic matter|load estimation|end-member mixing|size-exclusion chromatography',
  }),
  describeTopic('remote-sensing', 'faculty', [0.8, 2021, 7], ['dune-dynamics', 'ditch-blocking', 'lake-stratification'], {
    subjects: 'satellite time series|radar images|wetland habitat maps|spectral indices|drone orthomosaics|shoreline positions|inundation extents|surface-motion estimates',
    processes: 'classification|change detection|accuracy assessment|cloud gap filling|sub-pixel mapping|trend extraction|phenology retrieval|data fusion',
    drivers: 'tidal stage|mixed pixels|training-sample bias|sensor revisit time|vegetation wetness|image resolution|speckle|seasonal illumination',
    settings: 'wet landscapes|intertidal zones|moorland mosaics|turbid coastal waters|inland waters|protected sites|cloudy regions',
    methods: 'random forests|convolutional networks|radar interferometry|spectral unmixing|object-based analysis|cloud computing archives',
  }),
];
