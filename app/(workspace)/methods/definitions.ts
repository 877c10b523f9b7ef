interface Source {
  text: string;
  doi?: string;
}

export interface Definition {
  /** Anchor; the evidence panel links here. */
  id: string;
  name: string;
  definition: string;
  /** The rule in symbols, where words alone would be longer. */
  formula?: string;
  /** Where it misleads. */
  misleads: string;
  sources: Source[];
}

/** The measures in use, in the order in which people meet them. Wording follows the code in lib/network and lib/linking. */
export const definitions: { heading: string; entries: Definition[] }[] = [
  {
    heading: 'What is counted',
    entries: [
      {
        id: 'coverage',
        name: 'Coverage',
        definition: 'Two shares: of the catalogued works, how many carry a reference list; of the references in those lists, how many were linked to a catalogued work. It stands beside every figure that depends on it.',
        misleads: 'Works without a reference list cite nobody here, whatever they cite in print. A low share makes every count of citations too low, and unevenly so.',
        sources: [],
      },
      {
        id: 'citations-here',
        name: 'Citations here',
        definition: 'The number of distinct works of the portfolio that cite the work. A reference list that names a work twice counts once; a work that seems to cite itself is a fault of linking and does not count.',
        misleads: 'It measures the portfolio as much as the work: a work much used elsewhere may be little used here. Older works have had longer to be cited; reviews and methods collect more.',
        sources: [{ text: 'Price (1965), Networks of scientific papers, Science 149:510–515', doi: '10.1126/science.149.3683.510' }],
      },
      {
        id: 'linking',
        name: 'Linking and matching',
        definition: 'A reference is linked to a work by identifier; else where the fields that name it (first author, year, volume, first page, or its title) agree with one work only. Two records are one work when they share an identifier or all such fields. Near matches are proposed to a person with a score: each field that agrees or differs adds evidence for or against, and the sum is turned into a probability.',
        formula: 'W = Σ log₂(m/u) over fields that agree + Σ log₂((1 − m)/(1 − u)) over fields that differ',
        misleads: 'Wrong identifiers in a source link wrongly; thin references stay apart that belong together. Every link shows how it was made, and can be put right.',
        sources: [{ text: 'Fellegi & Sunter (1969), A theory for record linkage, J. American Statistical Association 64:1183–1210', doi: '10.1080/01621459.1969.10501049' }],
      },
    ],
  },
  {
    heading: 'How works are ranked',
    entries: [
      {
        id: 'pagerank',
        name: 'PageRank',
        definition: 'How often somebody would arrive at the work who reads at random: from each work they follow one of its references with probability d (the damping), and otherwise start again anywhere. A citation from a work that is itself well placed counts for more, and one from a long reference list for less. Shown with mean 1.',
        formula: 'pⱼ = d Σᵢ pᵢ aᵢⱼ / kᵢ + (d Σ over works without references pᵢ + 1 − d) / n',
        misleads: 'It flows to older works only. Two works that cite each other trap it; works in such a loop are marked. The default d is 0.5, as readers of papers follow about two links; 0.85 is shown beside it.',
        sources: [
          { text: 'Brin & Page (1998), The anatomy of a large-scale hypertextual web search engine, Computer Networks and ISDN Systems 30:107–117', doi: '10.1016/S0169-7552(98)00110-X' },
          { text: 'Chen, Xie, Maslov & Redner (2007), Finding scientific gems, J. Informetrics 1:8–15', doi: '10.1016/j.joi.2006.06.001' },
        ],
      },
      {
        id: 'rank-interval',
        name: 'Rank and its interval',
        definition: 'Rank 1 is the highest; works with equal values share a rank. The interval says between which ranks the work stood in 95 of 100 repeats, each with citing works drawn anew, with replacement, from those of the portfolio.',
        misleads: 'Works whose intervals overlap cannot be told apart by this measure. The interval covers which works happen to be in the portfolio, not faults of linking.',
        sources: [{ text: 'Efron (1979), Bootstrap methods: another look at the jackknife, Annals of Statistics 7:1–26', doi: '10.1214/aos/1176344552' }],
      },
      {
        id: 'age-percentile',
        name: 'Age-fair percentile',
        definition: 'Where the work stands in citations here among the works of its own publication year: the share of them that are cited less, half of the ties counted in. 50 is the middle of the year.',
        formula: 'P = 100 (number cited less + ½ number cited equally) / number in the year',
        misleads: 'In a year with few works, or few cited ones, it jumps. Works without a year have none.',
        sources: [],
      },
      {
        id: 'citations-per-year',
        name: 'Citations per year',
        definition: 'Citations here, divided by the years since publication up to the last year of the portfolio, at least one.',
        misleads: 'The first years after publication are slow in most fields; the last year is rarely complete.',
        sources: [],
      },
    ],
  },
  {
    heading: 'How works are grouped',
    entries: [
      {
        id: 'cocitation',
        name: 'Co-citation',
        definition: 'Two works are linked when later works cite both. It shows how those who cite have put the past in order.',
        misleads: 'New works have not been cited together yet. Works with very long reference lists are left out, so that a few reviews do not own the picture; their number is shown.',
        sources: [{ text: 'Small (1973), Co-citation in the scientific literature, J. American Society for Information Science 24:265–269', doi: '10.1002/asi.4630240406' }],
      },
      {
        id: 'coupling',
        name: 'Bibliographic coupling',
        definition: 'Two works are linked when they cite the same works. It is settled at publication, and so places new works too.',
        misleads: 'References that everybody gives link works that share little else. Works with few linked references are weakly placed.',
        sources: [{ text: 'Kessler (1963), Bibliographic coupling between scientific papers, American Documentation 14:10–25', doi: '10.1002/asi.5090140103' }],
      },
      {
        id: 'similarity',
        name: 'Similarity',
        definition: 'The count of shared citations, set against what the sizes of the two works would lead one to expect. Association strength (the default): observed over expected, 1 is as expected. Cosine: over the geometric mean of both sizes. Jaccard: shared over all.',
        formula: 'T cᵢⱼ / (sᵢ sⱼ);   cᵢⱼ / √(Nᵢ Nⱼ);   cᵢⱼ / (Nᵢ + Nⱼ − cᵢⱼ)',
        misleads: 'Association strength is large for rare works; cosine favours works of equal size.',
        sources: [
          { text: 'van Eck & Waltman (2009), How to normalize cooccurrence data?, J. American Society for Information Science and Technology 60:1635–1651', doi: '10.1002/asi.21075' },
          { text: 'Jaccard (1912), The distribution of the flora in the alpine zone, New Phytologist 11:37–50', doi: '10.1111/j.1469-8137.1912.tb05611.x' },
        ],
      },
      {
        id: 'clusters',
        name: 'Clusters',
        definition: 'Groups with more links inside than their sizes would give by chance (modularity at the chosen resolution), found by the Leiden method or, on request, the Louvain method. Many starts are tried and the best partition is kept. By co-citation and coupling, clusters rest on the 30 strongest links of each work, seen from either end; by direct citation on all of them. Works without a link belong to no cluster.',
        misleads: 'Clusters depend on the basis, the similarity and the resolution; small ones are swallowed at low resolution. Even a random network has some.',
        sources: [
          { text: 'Newman & Girvan (2004), Finding and evaluating community structure in networks, Physical Review E 69:026113', doi: '10.1103/PhysRevE.69.026113' },
          { text: 'Traag, Waltman & van Eck (2019), From Louvain to Leiden: guaranteeing well-connected communities, Scientific Reports 9:5233', doi: '10.1038/s41598-019-41695-z' },
          { text: 'Blondel, Guillaume, Lambiotte & Lefebvre (2008), Fast unfolding of communities in large networks, J. Statistical Mechanics P10008', doi: '10.1088/1742-5468/2008/10/P10008' },
        ],
      },
      {
        id: 'firmness',
        name: 'Firmness',
        definition: 'Of a work: over all starts, the mean share of the other members of its cluster that were with it. Of a cluster: the mean over its works. Works below 0.6 stand between groups and are drawn hollow. How far whole partitions agree is given as the adjusted Rand index.',
        misleads: 'A firm cluster is repeatable, which does not make it true.',
        sources: [{ text: 'Hubert & Arabie (1985), Comparing partitions, J. Classification 2:193–218', doi: '10.1007/BF01908075' }],
      },
      {
        id: 'conductance',
        name: 'Conductance',
        definition: 'The weight of the links that leave a cluster, over the weight of all links that end in it (or in the rest, if that is less). 0 is sealed off; above one half, more leads out than stays within.',
        misleads: 'Large clusters have it easier than small ones.',
        sources: [{ text: 'Kannan, Vempala & Vetta (2004), On clusterings: good, bad and spectral, J. ACM 51:497–515', doi: '10.1145/990308.990313' }],
      },
      {
        id: 'terms',
        name: 'Terms of a cluster',
        definition: 'Words of titles and keywords that occur in more of the cluster’s works than chance would put there, strongest evidence first. Each work counts once, however often it uses the word.',
        formula: 'G² = 2 Σ observed ln(observed / expected)',
        misleads: 'A name made of terms is a suggestion. Where works are in several languages, clusters may be named by language.',
        sources: [{ text: 'Dunning (1993), Accurate methods for the statistics of surprise and coincidence, Computational Linguistics 19:61–74 (aclanthology.org/J93-1003)' }],
      },
    ],
  },
];

export const cautions: { title: string; text: string }[] = [
  { title: 'Use, not quality', text: 'Citation figures describe how works are used in a set of documents. They say nothing of how good a work is, and support expert judgement without replacing it.' },
  { title: 'Not for decisions on persons', text: 'No figure here is made for hiring, promotion or pay. Heddle ranks no persons.' },
  { title: 'Only as good as its coverage', text: 'A citation that was not in an imported reference list, or was not linked, does not exist here. Read every figure with the coverage beside it.' },
  { title: 'Fields differ', text: 'How many references works give, how old those are and how fast new works are cited differs between fields, document types and languages. Raw counts of different fields cannot be compared.' },
  { title: 'Age', text: 'Older works have had longer to be cited, and the latest year is rarely complete. Age-fair figures stand beside the counts.' },
  { title: 'Small numbers', text: 'With few works, chance decides. Intervals are shown, and what rests on too few works is withheld.' },
  { title: 'Choices show', text: 'Clusters and maps depend on basis, similarity, resolution and seed. Each analysis names its own, and shows how firm its clusters are.' },
  { title: 'Retracted works', text: 'They stay in the network, because they were cited, and are marked wherever they appear.' },
];

export const agreements: Source[] = [
  { text: 'San Francisco Declaration on Research Assessment (DORA, 2012)' },
  { text: 'Hicks, Wouters, Waltman, de Rijcke & Rafols (2015), The Leiden Manifesto for research metrics, Nature 520:429–431', doi: '10.1038/520429a' },
  { text: 'Agreement on Reforming Research Assessment (CoARA, 2022)' },
];
