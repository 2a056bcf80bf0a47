const words = (text: string): ReadonlySet<string> => new Set(text.trim().split(/\s+/));

/** Elements that are drawn, or that drawn ones refer to. Anything else is left out. */
export const ELEMENTS = words(`
  svg g defs symbol use switch a path rect circle ellipse line polyline polygon text tspan textPath image
  linearGradient radialGradient stop clipPath mask pattern marker filter
  feBlend feColorMatrix feComponentTransfer feComposite feConvolveMatrix feDiffuseLighting feDisplacementMap
  feDropShadow feFlood feFuncA feFuncB feFuncG feFuncR feGaussianBlur feMerge feMergeNode feMorphology feOffset
  feSpecularLighting feTile feTurbulence feDistantLight fePointLight feSpotLight`);

/** Elements that carry nothing to draw; leaving them out changes nothing and is not told. */
export const SILENT = words('title desc metadata style view cursor solidColor hatch meshgradient namedview');

export const SHAPES = words('path rect circle ellipse line polyline polygon');

/** Attributes that are geometry or reference, by name; properties stand in `PROPERTIES`. */
export const ATTRIBUTES = words(`
  id transform x y x1 y1 x2 y2 width height cx cy r rx ry fx fy fr d points pathLength viewBox preserveAspectRatio
  gradientUnits gradientTransform spreadMethod offset clipPathUnits maskUnits maskContentUnits patternUnits
  patternContentUnits patternTransform markerUnits markerWidth markerHeight refX refY orient filterUnits primitiveUnits
  in in2 result stdDeviation edgeMode mode operator k1 k2 k3 k4 radius dx dy rotate textLength lengthAdjust startOffset
  method spacing side type values tableValues slope intercept amplitude exponent order kernelMatrix divisor bias targetX
  targetY kernelUnitLength preserveAlpha surfaceScale diffuseConstant specularConstant specularExponent
  limitingConeAngle azimuth elevation z pointsAtX pointsAtY pointsAtZ scale xChannelSelector yChannelSelector
  baseFrequency numOctaves seed stitchTiles xml:space systemLanguage requiredExtensions requiredFeatures href`);

const PROPERTIES = words(`
  alignment-baseline baseline-shift clip-path clip-rule color color-interpolation color-interpolation-filters
  direction display dominant-baseline enable-background fill fill-opacity fill-rule filter flood-color flood-opacity font
  font-family font-feature-settings font-kerning font-size font-size-adjust font-stretch font-style font-variant
  font-weight glyph-orientation-horizontal glyph-orientation-vertical image-rendering isolation letter-spacing
  lighting-color marker marker-end marker-mid marker-start mask mask-type mix-blend-mode opacity overflow paint-order
  pointer-events shape-rendering stop-color stop-opacity stroke stroke-dasharray stroke-dashoffset stroke-linecap
  stroke-linejoin stroke-miterlimit stroke-opacity stroke-width text-anchor text-decoration text-rendering transform-box
  transform-origin unicode-bidi vector-effect visibility white-space word-spacing writing-mode`);

/** Properties of a style sheet that are attributes elsewhere (SVG 2, section 6.4, geometry properties). */
const GEOMETRY = words('x y cx cy r rx ry width height transform');

export const isGeometry = (name: string): boolean => GEOMETRY.has(name);

/** Whether a style sheet may set it. */
export const isProperty = (name: string): boolean => PROPERTIES.has(name) || GEOMETRY.has(name);
