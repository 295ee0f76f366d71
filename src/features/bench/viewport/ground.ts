// The shop floor under the car: a scribed grid that fades out, in inches or centimetres, with the lasers thrown on it.
import { Mesh, PlaneGeometry, ShaderMaterial, Vector2 } from 'three';
import { MM_PER_INCH, type LengthDisplay } from '#shared/units';
import { tokenColour } from './colours';
import { MOST_LASERS, type SharedLight } from './light';
import { ORDER } from './part-objects';
import { centreOf, sizeOf, type Box } from './vectors';

const VERTEX = /* glsl */ `
  varying vec3 vWorld;
  void main() {
    vec4 world = modelMatrix * vec4(position, 1.0);
    vWorld = world.xyz;
    gl_Position = projectionMatrix * viewMatrix * world;
  }
`;

const FRAGMENT = /* glsl */ `
  uniform vec3 line;
  uniform vec3 laserColour;
  uniform float fine;
  uniform float coarse;
  uniform vec2 middle;
  uniform float reach;
  uniform vec4 lasers[${MOST_LASERS}];
  uniform int laserCount;
  uniform float density;
  varying vec3 vWorld;
  float grid(float step_, float width) {
    vec2 at = vWorld.xy / step_;
    vec2 px = fwidth(at);
    vec2 d = abs(fract(at - 0.5) - 0.5) / px / density;
    vec2 on = 1.0 - smoothstep(vec2(width - 0.5), vec2(width + 0.5), d);
    // lines that come closer than some pixels melt into nothing rather than into a grey
    vec2 fade = 1.0 - smoothstep(0.08, 0.3, px * density);
    return max(on.x * fade.x, on.y * fade.y);
  }
  void main() {
    float away = 1.0 - smoothstep(0.35, 1.0, length(vWorld.xy - middle) / reach);
    float alpha = max(grid(fine, 0.4) * 0.07, grid(coarse, 0.5) * 0.2) * away;
    vec3 colour = line;
    for (int i = 0; i < ${MOST_LASERS}; i++) {
      if (i >= laserCount) break;
      float d = dot(lasers[i].xyz, vWorld) - lasers[i].w;
      float step_ = fwidth(d);
      if (step_ < 1e-5 || abs(lasers[i].z) > 0.99) continue;
      float lit = (1.0 - smoothstep(0.4, 1.1, abs(d) / step_ / density)) * away * 0.8;
      colour = mix(colour, laserColour, lit);
      alpha = max(alpha, lit);
    }
    gl_FragColor = vec4(colour, alpha);
    #include <colorspace_fragment>
  }
`;

export interface Ground {
  readonly mesh: Mesh;
  /** Lays it under the scene's box and rules it in the person's unit. */
  readonly lay: (box: Box, display: LengthDisplay) => void;
  readonly dispose: () => void;
}

/** How far below the lowest part, so that a floor panel does not fight with it, mm. */
const BELOW = 2;

export function createGround(light: SharedLight): Ground {
  const middle = new Vector2();
  const uniforms = {
    line: { value: tokenColour('scribe-soft') },
    laserColour: light.laserColour,
    fine: { value: 25 },
    coarse: { value: 100 },
    middle: { value: middle },
    reach: { value: 1000 },
    lasers: light.lasers,
    laserCount: light.laserCount,
    density: light.density,
  };
  const material = new ShaderMaterial({
    vertexShader: VERTEX,
    fragmentShader: FRAGMENT,
    transparent: true,
    depthWrite: false,
    uniforms,
  });
  const mesh = new Mesh(new PlaneGeometry(2, 2), material);
  mesh.renderOrder = ORDER.ground;
  mesh.frustumCulled = false;
  return {
    mesh,
    lay: (box, display) => {
      const [x, y] = centreOf(box);
      const reach = Math.max(...sizeOf(box)) * 1.1;
      mesh.position.set(x, y, box.low[2] - BELOW);
      mesh.scale.set(reach, reach, 1);
      middle.set(x, y);
      uniforms.reach.value = reach;
      uniforms.fine.value = display === 'mm' ? 10 : MM_PER_INCH;
      uniforms.coarse.value = display === 'mm' ? 100 : 6 * MM_PER_INCH;
    },
    dispose: () => {
      mesh.geometry.dispose();
      material.dispose();
    },
  };
}
