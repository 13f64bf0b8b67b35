/** Depth of the wood at one crossing of the net at the travel under way: the falls that have begun, the least of them. */
const DEPTH = /* glsl */ `
  uniform highp sampler2D uFalls;
  uniform int uColumns, uRows, uLayers;
  uniform float uTravel;
  float depthOf(int id) {
    ivec2 at = ivec2(id % uColumns, id / uColumns);
    float depth = 0.0;
    for (int k = 0; k < uLayers; k++) {
      vec4 fall = texelFetch(uFalls, at + ivec2(0, k * uRows), 0);
      if (uTravel < fall.x) break; // they come in the order in which they begin
      float share = fall.z > fall.x ? clamp((uTravel - fall.x) / (fall.z - fall.x), 0.0, 1.0) : 1.0;
      depth = min(depth, mix(fall.y, fall.w, share));
    }
    return depth;
  }
`;

/** FIELD is the net over the cut, CAP the face that the section leaves; neither is the block round it. */
export const WOOD_VERTEX = /* glsl */ `
  precision highp int;
  varying vec3 vPlace;
  #if defined(FIELD) || defined(CAP)
    ${DEPTH}
  #endif
  #ifdef CAP
    attribute float aCrossing; // -1: stays where it is
  #endif
  void main() {
    vec3 place = position;
    #ifdef FIELD
      place.z = depthOf(gl_VertexID);
    #endif
    #ifdef CAP
      if (aCrossing >= 0.0) place.z = depthOf(int(aCrossing + 0.5));
    #endif
    vPlace = place;
    gl_Position = projectionMatrix * viewMatrix * vec4(place, 1.0);
  }
`;

export const WOOD_FRAGMENT = /* glsl */ `
  varying vec3 vPlace;
  uniform vec3 uWood, uHi, uLo, uGrain, uDeep;
  uniform sampler2D uLong, uEnd;
  uniform float uWide, uSlight, uMiddle;
  uniform bool uSection;
  vec3 along(vec3 base, vec2 at, float strength) {
    return mix(base, uGrain, texture2D(uLong, at / vec2(8.0 * uWide, uWide)).r * strength);
  }
  void main() {
    #ifndef CAP
      if (uSection && vPlace.y < uMiddle) discard;
    #endif
    vec3 n = normalize(cross(dFdx(vPlace), dFdy(vPlace)));
    if (dot(n, cameraPosition - vPlace) < 0.0) n = -n;
    vec3 colour;
    #if defined(CAP)
      colour = along(mix(uHi, uWood, 0.6), vPlace.xz, 0.55);
    #elif defined(FIELD)
      if (abs(n.z) > 0.6) {
        // The floor is shaded wood; the top round the cut is the top.
        colour = vPlace.z > -uSlight ? along(uHi, vPlace.xy, 0.5) : along(mix(uLo, uDeep, 0.25), vPlace.xy, 0.45);
      } else {
        // Light comes from the front left: the far walls catch some of it.
        colour = mix(uDeep, uLo, 0.25 + 0.35 * dot(n, vec3(-0.5, -0.86, 0.0)));
      }
    #else
      if (n.z > 0.6) colour = along(uHi, vPlace.xy, 0.5);
      else if (abs(n.x) > 0.6) colour = mix(uLo, uGrain, texture2D(uEnd, vec2(vPlace.y, vPlace.z) / uWide).r * 0.6);
      else colour = along(n.y < 0.0 ? uWood : mix(uWood, uLo, 0.5), vPlace.xz, 0.55);
    #endif
    gl_FragColor = vec4(colour, 1.0);
  }
`;

/** Lines of a set width on the screen; what is behind the travel is solid, what is ahead dashed, rapids dotted, a finish lap double. */
export const LINE_VERTEX = /* glsl */ `
  precision highp int;
  #ifdef PROFILE
    // The edge that the section leaves along the wood: its height comes from the wood.
    ${DEPTH}
    attribute vec2 aCrossings;
    vec3 onWood(vec3 place, float crossing) {
      return crossing < 0.0 ? place : vec3(place.xy, depthOf(int(crossing + 0.5)));
    }
  #endif
  attribute vec3 aFrom, aTo;
  attribute vec2 aTravel;
  attribute float aRapid;
  uniform vec2 uSize;
  uniform float uWidth, uPixels, uLift;
  varying float vTravel, vRapid, vAcross, vSide;
  void main() {
    #ifdef PROFILE
      vec3 fromPlace = onWood(aFrom, aCrossings.x), toPlace = onWood(aTo, aCrossings.y);
    #else
      vec3 fromPlace = aFrom, toPlace = aTo;
    #endif
    vec4 a = projectionMatrix * viewMatrix * vec4(fromPlace, 1.0);
    vec4 b = projectionMatrix * viewMatrix * vec4(toPlace, 1.0);
    // An end behind the eye is brought in front of it, or the line would fly off.
    float lensA = projectionMatrix[2][2], lensB = projectionMatrix[3][2];
    float near = lensB / (lensA - 1.0);
    vec2 kept = vec2(0.0, 1.0);
    if (a.w < near && b.w > near) kept.x = (near - a.w) / (b.w - a.w);
    if (b.w < near && a.w > near) kept.y = (near - a.w) / (b.w - a.w);
    vec4 first = a;
    a = mix(first, b, kept.x);
    b = mix(first, b, kept.y);
    vec2 from = a.xy / a.w * uSize, to = b.xy / b.w * uSize;
    vec2 way = to - from;
    way = length(way) > 1e-4 ? normalize(way) : vec2(1.0, 0.0);
    vec4 end = position.x < 0.5 ? a : b;
    vec2 shift = (way * (position.x < 0.5 ? -0.5 : 0.5) + vec2(-way.y, way.x) * position.y) * uWidth * uPixels * (aRapid < -0.5 ? 2.0 : 1.0);
    vSide = position.y;
    vTravel = mix(aTravel.x, aTravel.y, position.x < 0.5 ? kept.x : kept.y);
    vRapid = aRapid;
    vAcross = mix(aFrom.y, aTo.y, position.x < 0.5 ? kept.x : kept.y);
    gl_Position = vec4(end.xy + shift * 2.0 / uSize * end.w, 0.0, end.w);
    // A little nearer than it is, to lie on top of the face it lies on.
    gl_Position.z = lensB / (1.0 - uLift) - lensA * end.w;
  }
`;

export const LINE_FRAGMENT = /* glsl */ `
  varying float vTravel, vRapid, vAcross, vSide;
  uniform vec3 uColour, uRapidColour;
  uniform float uTravel, uOpacity, uPixels, uMiddle;
  uniform bool uSection;
  void main() {
    if (uSection && vAcross < uMiddle) discard;
    if (vRapid < -0.5 && abs(vSide) < 0.17) discard; // two lines with a gap
    #ifdef PROFILE
      bool ahead = false;
    #else
      bool ahead = vTravel > uTravel;
    #endif
    if (ahead || vRapid > 0.5) {
      // A period of about ten pixels, in steps of two, so that dashes neither crawl nor crowd as the view moves.
      float pixel = max(fwidth(vTravel), 1e-9) * uPixels;
      float period = exp2(ceil(log2(pixel * (vRapid > 0.5 ? 5.0 : 9.0))));
      if (fract(vTravel / period) > (vRapid > 0.5 ? 0.35 : 0.55)) discard;
    }
    gl_FragColor = vec4(vRapid > 0.5 ? uRapidColour : uColour, uOpacity);
  }
`;

/** Steel: three tones by where the face looks, as on the drawings; the light stands still while the bit turns. */
export const STEEL_VERTEX = /* glsl */ `
  varying vec3 vNormal;
  varying float vReach;
  uniform vec2 uSize;
  uniform float uHull, uPixels;
  void main() {
    vNormal = mat3(modelMatrix) * normal;
    vReach = length(position.xy);
    gl_Position = projectionMatrix * modelViewMatrix * vec4(position, 1.0);
    if (uHull > 0.0) {
      // Blown up by a pixel or two and drawn inside out, the same shape is its own outline.
      vec2 out2 = (projectionMatrix * viewMatrix * vec4(vNormal, 0.0)).xy * uSize;
      if (length(out2) > 1e-6) gl_Position.xy += normalize(out2) * uHull * uPixels * 2.0 / uSize * gl_Position.w;
    }
  }
`;

export const STEEL_FRAGMENT = /* glsl */ `
  varying vec3 vNormal;
  varying float vReach;
  uniform vec3 uBase, uHi, uLo;
  uniform float uLand; // radius inside which a flute lies in its own shade; 0: nothing does
  void main() {
    float light = dot(normalize(vNormal), normalize(vec3(-0.55, -0.75, 0.35)));
    vec3 colour = light > 0.0 ? mix(uBase, uHi, light) : mix(uBase, uLo, -light);
    gl_FragColor = vec4(mix(colour, uLo, vReach < uLand ? 0.85 : 0.0), 1.0);
  }
`;

/** The place of a reading, drawn round its point in the page's pixels whatever the distance. */
export const MARKER_VERTEX = /* glsl */ `
  uniform vec3 uPlace;
  uniform vec2 uSize;
  uniform float uReach, uPixels;
  varying vec2 vOff;
  void main() {
    vOff = position.xy * uReach;
    gl_Position = projectionMatrix * viewMatrix * vec4(uPlace, 1.0);
    gl_Position.xy += vOff * uPixels * 2.0 / uSize * gl_Position.w;
  }
`;

export const MARKER_FRAGMENT = /* glsl */ `
  varying vec2 vOff;
  uniform vec3 uColour, uCasing;
  uniform float uPixels;
  float inked(float off, float half_) { return clamp((half_ - off) * uPixels + 0.5, 0.0, 1.0); }
  void main() {
    float far = length(vOff);
    float ring = abs(far - 13.0);
    // Ticks run outward from the ring; within it nothing hides the place itself.
    float tick = max(min(abs(vOff.x), abs(vOff.y)), max(13.0 - far, far - 22.0));
    float off = min(ring, tick);
    float casing = inked(off, 3.5);
    if (casing == 0.0) discard;
    gl_FragColor = vec4(mix(uCasing, uColour, inked(off, 1.5)), casing);
  }
`;

/** The clamps' room: air that nothing may enter, so only hatched. */
export const HATCH_VERTEX = /* glsl */ `
  varying vec3 vPlace;
  void main() {
    vPlace = position;
    gl_Position = projectionMatrix * viewMatrix * vec4(position, 1.0);
  }
`;

export const HATCH_FRAGMENT = /* glsl */ `
  varying vec3 vPlace;
  uniform vec3 uColour;
  uniform float uPeriod;
  void main() {
    float line = abs(fract((vPlace.x + vPlace.y + vPlace.z) / uPeriod) - 0.5) * uPeriod / max(fwidth(vPlace.x + vPlace.y + vPlace.z), 1e-9);
    gl_FragColor = vec4(uColour, line < 0.8 ? 0.55 : 0.07);
  }
`;
