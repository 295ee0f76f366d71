// Scribe lines: as wide on the screen as they are told, whatever the distance. A line with normals beside it is drawn only
// where it is the outline of a rounded surface.
import {
  Color,
  Float32BufferAttribute,
  InstancedBufferAttribute,
  InstancedBufferGeometry,
  InstancedInterleavedBuffer,
  InterleavedBufferAttribute,
  ShaderMaterial,
} from 'three';
import { tokenColour } from './colours';
import type { SharedLight } from './light';
import type { Scribe } from './drawn';

const VERTEX = /* glsl */ `
  attribute vec3 from;
  attribute vec3 to;
  attribute vec3 beside;
  attribute vec3 opposite;
  attribute float extent;
  uniform vec2 screen;
  uniform float density;
  uniform float width;
  uniform float pull;
  varying vec3 vWorld;
  varying float vAway;
  varying float vFade;
  void main() {
    vec4 a = modelViewMatrix * vec4(from, 1.0);
    vec4 b = modelViewMatrix * vec4(to, 1.0);
    bool isHidden = false;
    if (dot(beside, beside) > 0.0) {
      vec3 toEye = isOrthographic ? vec3(0.0, 0.0, 1.0) : -0.5 * (a.xyz + b.xyz);
      float s = dot(normalMatrix * beside, toEye);
      float t = dot(normalMatrix * opposite, toEye);
      isHidden = s * t > 0.0;
    }
    if (!isOrthographic) {
      // a line that goes through the plane of the eye is cut off before it
      float near = projectionMatrix[3][2] / (projectionMatrix[2][2] - 1.0);
      if (a.z > -near && b.z > -near) isHidden = true;
      else if (a.z > -near) a = mix(b, a, (-near - b.z) / (a.z - b.z));
      else if (b.z > -near) b = mix(a, b, (-near - a.z) / (b.z - a.z));
    }
    vec4 clipA = projectionMatrix * a;
    vec4 clipB = projectionMatrix * b;
    vec2 along = (clipB.xy / clipB.w - clipA.xy / clipA.w) * screen;
    float size = length(along);
    along = size > 1e-6 ? along / size : vec2(1.0, 0.0);
    vec2 across = vec2(along.y, -along.x);
    vec4 clip = position.y < 0.5 ? clipA : clipB;
    // what is only some pixels large would be nothing but lines
    float px = extent * projectionMatrix[1][1] * 0.5 * screen.y / clip.w / density;
    vFade = smoothstep(5.0, 30.0, px);
    if (vFade < 0.02) isHidden = true;
    // a little longer at both ends, so that corners close
    vec2 offset = across * position.x + along * (position.y < 0.5 ? -0.5 : 0.5) * 0.8;
    clip.xy += offset * 2.0 * width * density / screen * clip.w;
    // a hair towards the eye, so that a line is not lost in the face it lies on
    clip.z -= pull * clip.w;
    vWorld = (modelMatrix * vec4(position.y < 0.5 ? from : to, 1.0)).xyz;
    vAway = length((position.y < 0.5 ? a : b).xyz);
    gl_Position = isHidden ? vec4(2.0, 2.0, 2.0, 0.0) : clip;
  }
`;

const FRAGMENT = /* glsl */ `
  uniform vec3 colour;
  uniform float opacity;
  uniform vec3 dye;
  uniform vec4 cut;
  uniform bool isCut;
  uniform vec2 recede;
  varying vec3 vWorld;
  varying float vAway;
  varying float vFade;
  void main() {
    if (isCut && dot(cut.xyz, vWorld) > cut.w) discard;
    float away = smoothstep(recede.x, recede.y, vAway);
    gl_FragColor = vec4(mix(colour, dye, away * 0.5), opacity * vFade);
    #include <colorspace_fragment>
  }
`;

export interface ScribeLine {
  readonly colour: string;
  /** CSS px. */
  readonly width: number;
  readonly opacity: number;
}

export function createScribeMaterial(light: SharedLight, line: ScribeLine, pull = 2e-4): ShaderMaterial {
  const material = new ShaderMaterial({
    vertexShader: VERTEX,
    fragmentShader: FRAGMENT,
    transparent: true,
    depthWrite: false,
    uniforms: {
      screen: light.screen,
      density: light.density,
      cut: light.cut,
      isCut: light.isCut,
      recede: light.recede,
      dye: { value: tokenColour('dye') },
      colour: { value: new Color() },
      width: { value: 1 },
      opacity: { value: 1 },
      pull: { value: pull },
    },
  });
  setLine(material, line);
  return material;
}

export function setLine(material: ShaderMaterial, { colour, width, opacity }: ScribeLine): void {
  const u = material.uniforms as Record<string, { value: unknown }>;
  u['colour']!.value = tokenColour(colour);
  u['width']!.value = width;
  u['opacity']!.value = opacity;
}

/** Two triangles for each line, stretched out in the vertex shader. */
export function scribeGeometry(scribe: Scribe): InstancedBufferGeometry {
  const geometry = new InstancedBufferGeometry();
  geometry.setAttribute('position', new Float32BufferAttribute([-0.5, 0, 0, 0.5, 0, 0, 0.5, 1, 0, -0.5, 1, 0], 3));
  geometry.setIndex([0, 1, 2, 0, 2, 3]);
  const ends = new InstancedInterleavedBuffer(scribe.ends, 6, 1);
  const beside = new InstancedInterleavedBuffer(scribe.normals, 6, 1);
  geometry.setAttribute('from', new InterleavedBufferAttribute(ends, 3, 0));
  geometry.setAttribute('to', new InterleavedBufferAttribute(ends, 3, 3));
  geometry.setAttribute('beside', new InterleavedBufferAttribute(beside, 3, 0));
  geometry.setAttribute('opposite', new InterleavedBufferAttribute(beside, 3, 3));
  geometry.setAttribute('extent', new InstancedBufferAttribute(scribe.extents, 1));
  geometry.instanceCount = scribe.ends.length / 6;
  return geometry;
}
