// The fill of a part: its finish under a soft light from the upper left of whoever looks, lasers thrown on it, hatching where
// its measures are guessed. Glass is thin where it is looked through and denser at its edges.
import { Color, DoubleSide, FrontSide, ShaderMaterial, Vector2 } from 'three';
import { tokenColour } from './colours';
import { MOST_LASERS, type SharedLight } from './light';
import { FINISH_LOOK, type PartLook, type Presence } from './look';

const VERTEX = /* glsl */ `
  varying vec3 vWorld;
  varying vec3 vNormal;
  varying vec3 vToEye;
  void main() {
    vec4 world = modelMatrix * vec4(position, 1.0);
    vec4 view = viewMatrix * world;
    vWorld = world.xyz;
    vNormal = normalMatrix * normal;
    vToEye = -view.xyz;
    gl_Position = projectionMatrix * view;
  }
`;

const FRAGMENT = /* glsl */ `
  uniform vec3 base;
  uniform vec3 dye;
  uniform vec3 sky;
  uniform vec3 scribe;
  uniform float gloss;
  uniform float sharpness;
  uniform float rim;
  /** Alpha looked straight through, and at the edge. */
  uniform vec2 veil;
  uniform bool isVeiled;
  uniform bool isGuessed;
  uniform float lift;
  uniform vec4 lasers[${MOST_LASERS}];
  uniform int laserCount;
  uniform vec3 laserColour;
  uniform vec4 cut;
  uniform bool isCut;
  uniform float density;
  uniform vec2 recede;
  varying vec3 vWorld;
  varying vec3 vNormal;
  varying vec3 vToEye;

  /** Parallel lines over the screen, \`gap\` CSS px apart, 0 to 1. */
  float hatch(float gap, float width) {
    float across = (gl_FragCoord.x - gl_FragCoord.y) * 0.70710678 / density;
    float d = abs(mod(across, gap) - gap * 0.5);
    return 1.0 - smoothstep(width - 0.5, width + 0.5, d);
  }

  void main() {
    if (isCut && dot(cut.xyz, vWorld) > cut.w) discard;
    vec3 toEye = isOrthographic ? vec3(0.0, 0.0, 1.0) : normalize(vToEye);
    vec3 n = normalize(vNormal);
    bool isInside = !gl_FrontFacing;
    if (isInside) n = -n;

    float key = 0.5 + 0.5 * dot(n, normalize(vec3(-0.46, 0.72, 0.52)));
    float fill = 0.5 + 0.5 * dot(n, normalize(vec3(0.75, -0.15, 0.35)));
    vec3 up = (viewMatrix * vec4(0.0, 0.0, 1.0, 0.0)).xyz;
    float high = 0.5 + 0.5 * dot(n, up);
    vec3 light = mix(dye * 1.5, sky, high) * 0.36 + vec3(key * key * 0.78) + vec3(0.62, 0.66, 1.0) * fill * fill * 0.13;
    vec3 colour = base * light;
    float facing = clamp(dot(n, toEye), 0.0, 1.0);
    vec3 half_ = normalize(normalize(vec3(-0.46, 0.72, 0.52)) + toEye);
    colour += gloss * pow(clamp(dot(n, half_), 0.0, 1.0), sharpness) * mix(vec3(1.0), base, 0.35);
    float edge = pow(1.0 - facing, 3.0);
    colour += rim * edge * scribe * 0.6;
    colour = mix(colour, scribe, lift * 0.16);

    float alpha = 1.0;
    if (isVeiled) alpha = mix(veil.x, veil.y, pow(1.0 - facing, 2.0)) + lift * 0.08;
    if (isGuessed) {
      float line = hatch(7.0, 0.7);
      colour = mix(colour, scribe, line * 0.3);
      if (isVeiled) alpha = max(alpha, line * 0.24);
    }
    // where it is cut open its inside shows as a section: flat, hatched in its own colour
    if (isInside && isCut && !isVeiled) colour = mix(base * 0.72, scribe, 0.12 + 0.38 * hatch(6.0, 0.6));

    float away = smoothstep(recede.x, recede.y, length(vToEye));
    colour = mix(colour, dye * 0.9, away * 0.55);

    vec3 pace = fwidth(vWorld);
    float grazing = 0.03 * length(pace);
    for (int i = 0; i < ${MOST_LASERS}; i++) {
      if (i >= laserCount) break;
      float d = dot(lasers[i].xyz, vWorld) - lasers[i].w;
      float step_ = fwidth(d);
      // a face that lies along the laser would be lit all over: a real line only grazes it
      if (step_ < grazing) continue;
      float px = abs(d) / step_ / density;
      float core = 1.0 - smoothstep(0.55, 1.15, px);
      float bloom = exp(-px * px * 0.09) * 0.22;
      float lit = max(core, bloom);
      colour = mix(colour, laserColour, lit);
      alpha = max(alpha, lit * 0.95);
    }
    gl_FragColor = vec4(colour, alpha);
    #include <colorspace_fragment>
  }
`;

const VEIL: Readonly<Record<Presence, readonly [number, number]>> = {
  whole: [1, 1],
  glass: [0.1, 0.42],
  faded: [0.05, 0.2],
};

export type FinishMaterial = ShaderMaterial;

export function createFinishMaterial(light: SharedLight): FinishMaterial {
  return new ShaderMaterial({
    vertexShader: VERTEX,
    fragmentShader: FRAGMENT,
    polygonOffset: true,
    polygonOffsetFactor: 1,
    polygonOffsetUnits: 2,
    uniforms: {
      lasers: light.lasers,
      laserCount: light.laserCount,
      laserColour: light.laserColour,
      cut: light.cut,
      isCut: light.isCut,
      density: light.density,
      recede: light.recede,
      dye: { value: tokenColour('dye') },
      sky: { value: tokenColour('scribe') },
      scribe: { value: tokenColour('scribe') },
      base: { value: new Color() },
      gloss: { value: 0 },
      sharpness: { value: 1 },
      rim: { value: 0 },
      veil: { value: new Vector2(1, 1) },
      isVeiled: { value: false },
      isGuessed: { value: false },
      lift: { value: 0 },
    },
  });
}

/** Puts a look on a material. @param closed whether the surface has an inside that never shows */
export function wearLook(material: FinishMaterial, look: PartLook, closed: boolean, isCut: boolean): void {
  const u = material.uniforms as Record<string, { value: unknown }>;
  const { gloss, sharpness, rim } = FINISH_LOOK[look.finish];
  const isVeiled = look.presence !== 'whole';
  u['base']!.value = tokenColour(look.finish);
  u['gloss']!.value = gloss;
  u['sharpness']!.value = sharpness;
  u['rim']!.value = rim;
  (u['veil']!.value as Vector2).set(...VEIL[look.presence]);
  u['isVeiled']!.value = isVeiled;
  u['isGuessed']!.value = look.guessed;
  const side = closed && !(isCut && !isVeiled) ? FrontSide : DoubleSide;
  if (material.transparent !== isVeiled || material.side !== side) {
    material.transparent = isVeiled;
    material.depthWrite = !isVeiled;
    material.side = side;
    material.needsUpdate = true;
  }
}

/** How much a part stands out under the pointer, 0 to 1. */
export function setLift(material: FinishMaterial, lift: number): void {
  (material.uniforms as Record<string, { value: unknown }>)['lift']!.value = lift;
}
