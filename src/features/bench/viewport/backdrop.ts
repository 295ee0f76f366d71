// The ground everything stands on: layout dye, brushed on by hand, darker towards the edge of the sheet.
import { BufferGeometry, Float32BufferAttribute, Mesh, ShaderMaterial } from 'three';
import { tokenColour } from './colours';
import type { SharedLight } from './light';

const VERTEX = /* glsl */ `
  varying vec2 vAt;
  void main() {
    vAt = position.xy;
    gl_Position = vec4(position.xy, 1.0, 1.0);
  }
`;

const FRAGMENT = /* glsl */ `
  uniform vec3 middle;
  uniform vec3 edge;
  uniform vec3 lift;
  uniform vec2 screen;
  uniform float density;
  varying vec2 vAt;
  float grain(float x) { return fract(sin(x * 127.1) * 43758.5453); }
  float strand(float x) {
    float i = floor(x);
    float f = fract(x);
    return mix(grain(i), grain(i + 1.0), f * f * (3.0 - 2.0 * f));
  }
  void main() {
    vec2 px = 0.5 * (vAt + 1.0) * screen / density;
    // strokes of the brush: long, nearly level, uneven
    float across = px.y + px.x * 0.045 + 9.0 * sin(px.x * 0.0021);
    float stroke = strand(across * 0.33) * 0.45 + strand(across * 0.071 + 31.0) * 0.9 + strand(across * 1.1) * 0.2;
    float away = smoothstep(0.1, 1.5, length(vAt * vec2(0.85, 1.0) - vec2(-0.1, 0.12)));
    vec3 colour = mix(mix(middle, lift, 0.16), edge, away);
    colour *= 0.97 + 0.042 * (stroke - 0.75);
    gl_FragColor = vec4(colour, 1.0);
    #include <colorspace_fragment>
  }
`;

export function createBackdrop(light: SharedLight): Mesh {
  const geometry = new BufferGeometry();
  geometry.setAttribute('position', new Float32BufferAttribute([-1, -1, 0, 3, -1, 0, -1, 3, 0], 3));
  const material = new ShaderMaterial({
    vertexShader: VERTEX,
    fragmentShader: FRAGMENT,
    depthTest: false,
    depthWrite: false,
    uniforms: {
      middle: { value: tokenColour('dye') },
      edge: { value: tokenColour('dye-deep') },
      lift: { value: tokenColour('dye-lift') },
      screen: light.screen,
      density: light.density,
    },
  });
  const mesh = new Mesh(geometry, material);
  mesh.frustumCulled = false;
  mesh.renderOrder = -10;
  return mesh;
}
