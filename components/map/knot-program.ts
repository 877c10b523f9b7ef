import { NodeProgram, type ProgramInfo } from 'sigma/rendering';
import { type NodeDisplayData, type RenderParams } from 'sigma/types';
import { floatColor } from 'sigma/utils';

const { FLOAT, UNSIGNED_BYTE, TRIANGLES } = WebGLRenderingContext;

const vertexShader = /* glsl */ `
attribute vec4 a_id;
attribute vec4 a_color;
attribute vec4 a_hem;
attribute vec2 a_position;
attribute float a_size;
attribute float a_width;
attribute vec2 a_corner;

uniform mat3 u_matrix;
uniform float u_sizeRatio;
uniform float u_correctionRatio;

varying vec4 v_color;
varying vec4 v_hem;
varying vec2 v_corner;
varying float v_half;
varying float v_width;

const float bias = 255.0 / 254.0;

void main() {
  float half_side = a_size * u_correctionRatio / u_sizeRatio * 2.0;
  gl_Position = vec4((u_matrix * vec3(a_position + half_side * a_corner, 1)).xy, 0, 1);
  v_corner = a_corner;
  v_half = a_size / u_sizeRatio;
  v_width = a_width;
  #ifdef PICKING_MODE
  v_color = a_id;
  #else
  v_color = a_color;
  v_hem = a_hem;
  v_hem.a *= bias;
  #endif
  v_color.a *= bias;
}
`;

const fragmentShader = /* glsl */ `
precision mediump float;
varying vec4 v_color;
varying vec4 v_hem;
varying vec2 v_corner;
varying float v_half;
varying float v_width;

void main(void) {
  #ifdef PICKING_MODE
  gl_FragColor = v_color;
  #else
  float from_edge = (1.0 - max(abs(v_corner.x), abs(v_corner.y))) * v_half;
  gl_FragColor = from_edge < v_width ? v_hem : v_color;
  #endif
}
`;

/** How a knot is drawn, beside sigma's own fields. */
export interface KnotLook {
  /** Colour of its edge. */
  hem: string;
  /** Width of that edge in pixels. */
  hemWidth: number;
}

const uniforms = ['u_sizeRatio', 'u_correctionRatio', 'u_matrix'] as const;

/** Works as square knots: an edge of its own colour sets neighbours apart, and a knot filled with the ground is hollow. */
export class KnotProgram extends NodeProgram<(typeof uniforms)[number]> {
  override getDefinition() {
    return {
      VERTICES: 6,
      VERTEX_SHADER_SOURCE: vertexShader,
      FRAGMENT_SHADER_SOURCE: fragmentShader,
      METHOD: TRIANGLES as number as 4,
      UNIFORMS: uniforms,
      ATTRIBUTES: [
        { name: 'a_position', size: 2, type: FLOAT },
        { name: 'a_size', size: 1, type: FLOAT },
        { name: 'a_width', size: 1, type: FLOAT },
        { name: 'a_color', size: 4, type: UNSIGNED_BYTE, normalized: true },
        { name: 'a_hem', size: 4, type: UNSIGNED_BYTE, normalized: true },
        { name: 'a_id', size: 4, type: UNSIGNED_BYTE, normalized: true },
      ],
      CONSTANT_ATTRIBUTES: [{ name: 'a_corner', size: 2, type: FLOAT }],
      CONSTANT_DATA: [[-1, -1], [1, -1], [1, 1], [-1, -1], [1, 1], [-1, 1]],
    };
  }

  override processVisibleItem(nodeIndex: number, startIndex: number, data: NodeDisplayData & Partial<KnotLook>): void {
    const { array } = this;
    let at = startIndex;
    array[at++] = data.x;
    array[at++] = data.y;
    array[at++] = data.size;
    array[at++] = data.hemWidth ?? 0;
    array[at++] = floatColor(data.color);
    array[at++] = floatColor(data.hem ?? data.color);
    array[at++] = nodeIndex;
  }

  override setUniforms(parameters: RenderParams, { gl, uniformLocations }: ProgramInfo<(typeof uniforms)[number]>): void {
    gl.uniform1f(uniformLocations.u_sizeRatio, parameters.sizeRatio);
    gl.uniform1f(uniformLocations.u_correctionRatio, parameters.correctionRatio);
    gl.uniformMatrix3fv(uniformLocations.u_matrix, false, parameters.matrix);
  }
}
