import { describeTopic, type Topic } from '@/lib/demonstration/topics/topic';

export const peatTopics: Topic[] = [
  describeTopic('drained-peat-carbon', 'peat', [1.5, 2011, 13], ['soil-respiration', 'peat-hydrology', 'paludiculture'], {
    subjects: 'drained peat soils|cutover bogs|peat carbon stocks|agricultural peatlands|peat profiles|fen grasslands|forested peatlands|extraction fields',
    processes: 'carbon loss|subsidence|peat oxidation|shrinkage|emission factors|long-term accumulation|bulk-density change|stock depletion',
    drivers: 'deep drainage|water-table drawdown|arable cropping|peat extraction|liming and fertiliser|grassland renewal|wildfire|mineral soil cover',
    settings: 'drained fens|raised bogs|river-valley mires|polder peat|boreal peatlands|blanket bog|peat meadows',
    methods: 'closed-chamber fluxes|subsidence poles|ash-content balances|eddy covariance towers|radiocarbon dating|land-survey archives',
  }),
  describeTopic('soil-respiration', 'peat', [1.2, 2005, 14], ['drained-peat-carbon', 'soil-fungi', 'catchment-carbon'], {
    subjects: 'heterotrophic fluxes|root-free soils|incubated soil cores|forest-floor layers|soil carbon pools|root systems|arable topsoils|respiring soil layers',
    processes: 'temperature sensitivity|carbon dioxide efflux|basal respiration|acclimation|diurnal hysteresis|priming|substrate limitation|winter efflux',
    drivers: 'soil warming|drying-rewetting cycles|substrate supply|soil moisture|nitrogen addition|clay content|snow cover|girdling of trees',
    settings: 'temperate grasslands|spruce plantations|organic soils|heathland soils|fallow plots|gley soils|podzol catenas',
    methods: 'root-exclusion collars|automated chambers|laboratory incubation|carbon-13 labelling|Arrhenius models|soil gas profiles',
  }),
  describeTopic('peat-hydrology', 'peat', [1.1, 2000, 16], ['ditch-blocking', 'drained-peat-carbon', 'flood-risk'], {
    subjects: 'peat pipes|acrotelm layers|blanket peat catchments|bog pools|peat columns|macropores|hummock-hollow complexes|peat aquifers',
    processes: 'hydraulic conductivity|runoff generation|water storage|pipeflow|saturation-excess overland flow|water-table fluctuation|peat swelling|evapotranspiration',
    drivers: 'summer drought|moor-gripping|Sphagnum cover|burn rotation|rainfall intensity|entrapped gas|slope position|peat humification',
    settings: 'blanket mires|patterned bogs|small peat catchments|gullied moorland|lagg zones|fen basins|plateau mires',
    methods: 'piezometer nests|slug tests|tension infiltrometers|ground-penetrating radar|dye tracing|groundwater models',
  }),
  describeTopic('ditch-blocking', 'peat', [1, 2016, 8], ['peat-hydrology', 'paludiculture', 'drained-peat-carbon'], {
    subjects: 'blocked grips|rewetted bogs|Sphagnum carpets|cotton-grass swards|peat dams|restored gullies|bare peat surfaces|bog vegetation stands',
    processes: 'revegetation|water-table recovery|plant succession|Sphagnum spread|dam failure|peat stabilisation|bird recolonisation|re-establishment',
    drivers: 'plastic piling|heather bale dams|nurse plants|mulch application|grazing removal|tree felling|nutrient legacy|dam spacing',
    settings: 'eroded blanket bog|rewetted raised bogs|former peat cuttings|moorland estates|felled plantations|upland commons|abandoned peat fields',
    methods: 'paired-catchment designs|vegetation relevés|water-table loggers|aerial photographs|moss reintroduction trials|repeat levelling',
  }),
  describeTopic('soil-fungi', 'peat', [1, 2017, 9], ['soil-respiration', 'ditch-blocking', 'drained-peat-carbon'], {
    subjects: 'ericoid mycorrhizas|saprotrophic fungi|fungal hyphae|ectomycorrhizal communities|fungal guilds|dark septate endophytes|wood-decay fungi|arbuscular mycorrhizas',
    processes: 'litter decomposition|nitrogen mining|community assembly|enzyme production|hyphal turnover|host specificity|necromass formation|competition',
    drivers: 'nitrogen deposition|host identity|heather burning|tree encroachment|waterlogging|phosphorus supply|soil acidity|biochar',
    settings: 'heathland soils|bog margins|birch woodland|acid grassland|afforested mires|peat nurseries|litter layers',
    methods: 'amplicon sequencing|ingrowth bags|phospholipid fatty acids|hyphal in-growth cores|enzyme assays|root-tip morphotyping',
  }),
  describeTopic('testate-amoebae', 'peat', [0.9, 2004, 10], ['peat-hydrology', 'diatoms', 'drained-peat-carbon'], {
    subjects: 'testate amoebae|peatland protists|Holocene bog records|fossil amoeba tests|mixotrophic amoebae|macrofossil sequences|tephra-dated cores|amoeba assemblages',
    processes: 'wetness reconstruction|taphonomy|species sorting|moisture preference|test preservation|climate inference|abundance change|chronological alignment',
    drivers: 'bog-surface wetness|late-Holocene climate shifts|tephra fall|microtopography|drainage history|summer rainfall|dust input|volcanic aerosols',
    settings: 'ombrotrophic bogs|Atlantic margin bogs|raised-bog cores|Sphagnum hollows|floating mires|island peatlands|kettle-hole mires',
    methods: 'transfer functions|age-depth modelling|constrained ordination|plant macrofossil analysis|wiggle-match dating|multi-proxy stacking',
  }),
  describeTopic('paludiculture', 'peat', [0.8, 2022, 6], ['reed-bed-nutrients', 'ditch-blocking', 'wetland-gases'], {
    subjects: 'cattail crops|Sphagnum farms|wet-grassland swards|paludiculture plots|biomass crops|reed-canary-grass fields|farm enterprises|insulation boards from cattail',
    processes: 'crop yield|farm income|nutrient offtake|establishment|machine trafficability|product quality|carbon crediting|adoption',
    drivers: 'raised water levels|subsidy reform|harvest timing|topsoil removal|irrigation quality|land tenure|market demand|seed-based planting',
    settings: 'rewetted peat meadows|polder farms|pilot sites|former dairy land|fen polders|demonstration farms|valley fens',
    methods: 'farm-scale trials|life-cycle assessment|choice experiments|yield plots|stakeholder interviews|drone biomass estimates',
  }),
];
