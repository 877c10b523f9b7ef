import { buildNetwork } from '@/lib/network/compressed-rows';
import { orderByKey } from '@/lib/network/scope';
import { type AnalysisInput, type AnalysisParameters, type AnalysisResult } from '@/lib/network/types';

/**
 * Canonical bytes of inputs and results, for fingerprints (the caller hashes them).
 * Little-endian whatever the machine; arrays and strings carry their length; NaN has one pattern and minus zero is zero; null is a byte of its own.
 * Bytes begin with a version, so that a change of layout can never pass for a change of content.
 */
class ByteWriter {
  private bytes = new Uint8Array(1 << 16);
  private view = new DataView(this.bytes.buffer);
  private length = 0;
  private readonly encoder = new TextEncoder();

  whole(value: number): void {
    this.reserve(4);
    this.view.setUint32(this.length, value >>> 0, true);
    this.length += 4;
  }

  real(value: number): void {
    this.reserve(8);
    if (Number.isNaN(value)) {
      this.view.setUint32(this.length, 0, true);
      this.view.setUint32(this.length + 4, 0x7ff80000, true);
    } else this.view.setFloat64(this.length, value === 0 ? 0 : value, true);
    this.length += 8;
  }

  optional(value: number | null): void {
    this.flag(value !== null);
    if (value !== null) this.real(value);
  }

  flag(value: boolean): void {
    this.reserve(1);
    this.view.setUint8(this.length, value ? 1 : 0);
    this.length += 1;
  }

  text(value: string): void {
    const encoded = this.encoder.encode(value);
    this.whole(encoded.length);
    this.reserve(encoded.length);
    this.bytes.set(encoded, this.length);
    this.length += encoded.length;
  }

  wholes(values: ArrayLike<number>): void {
    this.whole(values.length);
    for (let place = 0; place < values.length; place += 1) this.whole(values[place]);
  }

  reals(values: ArrayLike<number>): void {
    this.whole(values.length);
    for (let place = 0; place < values.length; place += 1) this.real(values[place]);
  }

  done(): Uint8Array {
    return this.bytes.slice(0, this.length);
  }

  private reserve(extra: number): void {
    if (this.length + extra <= this.bytes.length) return;
    const larger = new Uint8Array(Math.max(2 * this.bytes.length, this.length + extra));
    larger.set(this.bytes);
    this.bytes = larger;
    this.view = new DataView(larger.buffer);
  }
}

/**
 * Bytes of an input and its parameters, the same whatever the order of works and citations, and whether a citation is given once or more often.
 * Throws a RangeError for input that `analyseNetwork` would refuse.
 */
export function serialiseInput(input: AnalysisInput, parameters: AnalysisParameters): Uint8Array {
  const writer = new ByteWriter();
  writer.text('analysis input 1');
  writeParameters(writer, parameters);
  const order = orderByKey(input.works);
  const place = new Uint32Array(order.length);
  order.forEach((index, number) => {
    place[index] = number;
  });
  writer.whole(order.length);
  for (const index of order) {
    const { key, year, catalogued, title, keywords } = input.works[index];
    writer.text(key);
    writer.optional(year);
    writer.flag(catalogued);
    writer.text(title);
    writer.whole(keywords.length);
    keywords.forEach((keyword) => writer.text(keyword));
  }
  const citing = Array.from(input.citing, (index) => place[index] ?? order.length);
  const cited = Array.from(input.cited, (index) => place[index] ?? order.length);
  const { network } = buildNetwork(order.length, citing, cited);
  writer.wholes(network.offsets);
  writer.wholes(network.targets);
  return writer.done();
}

function writeParameters(writer: ByteWriter, parameters: AnalysisParameters): void {
  writer.text(parameters.scope);
  writer.optional(parameters.periodFrom);
  writer.optional(parameters.periodTo);
  writer.real(parameters.minimumCitations);
  writer.real(parameters.damping);
  writer.text(parameters.similarity);
  writer.text(parameters.clustering);
  writer.real(parameters.resolution);
  writer.real(parameters.repeats);
  writer.real(parameters.replicates);
  writer.real(parameters.maximumReferences);
  writer.real(parameters.seed);
}

/**
 * Bytes of a result. `workIndex` is left out: it points into the input as it happened to be ordered, while everything else follows the order
 * of the keys, which the input's own bytes fix.
 */
export function serialiseResult(result: AnalysisResult): Uint8Array {
  const writer = new ByteWriter();
  writer.text('analysis result 1');
  writer.wholes(result.inDegree);
  writer.wholes(result.outDegree);
  writer.reals(result.pageRank);
  writer.reals(result.pageRankHigh);
  for (const ranks of [result.rank, result.rankLow, result.rankHigh, result.citationRank, result.citationRankLow, result.citationRankHigh]) writer.wholes(ranks);
  writer.reals(result.agePercentile);
  writer.reals(result.citationsPerYear);
  writer.wholes(result.inLoop);
  writer.whole(result.bases.length);
  result.bases.forEach((basis) => writeBasis(writer, basis));
  writeRun(writer, result.run);
  return writer.done();
}

function writeBasis(writer: ByteWriter, basis: AnalysisResult['bases'][number]): void {
  writer.text(basis.basis);
  writer.whole(basis.linkedWorks);
  writer.real(basis.pairs);
  writer.real(basis.modularity);
  writer.optional(basis.agreementMean);
  writer.optional(basis.agreementMinimum);
  writer.wholes(basis.cluster);
  writer.reals(basis.firmness);
  writer.whole(basis.clusters.length);
  for (const cluster of basis.clusters) {
    writer.text(cluster.letter);
    writer.text(cluster.name);
    writer.whole(cluster.size);
    writer.whole(cluster.terms.length);
    for (const { term, works, logLikelihood } of cluster.terms) {
      writer.text(term);
      writer.whole(works);
      writer.real(logLikelihood);
    }
    writer.real(cluster.firmness);
    for (const value of [cluster.conductance, cluster.firstYear, cluster.medianYear, cluster.lastYear]) writer.optional(value);
  }
  writer.reals(basis.x);
  writer.reals(basis.y);
  writer.wholes(basis.linkSource);
  writer.wholes(basis.linkTarget);
  writer.reals(basis.linkWeight);
  writer.reals(basis.clusterCitations);
}

function writeRun(writer: ByteWriter, run: AnalysisResult['run']): void {
  const counts = [run.works, run.citations, run.cataloguedWorks, run.citedOnlyWorks, run.pageRankIterations, run.danglingWorks, run.loops, run.loopWorks, run.backwardLinks, run.skippedForReferences];
  writer.wholes(counts);
  writer.real(run.pageRankResidual);
  writer.flag(run.pageRankConverged);
  writer.optional(run.lastYear);
  writer.whole(run.seed);
  writer.text(run.engine);
}
