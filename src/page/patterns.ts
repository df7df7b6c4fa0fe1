// Patterns that tell fields apart where there is no colour. They stand once on a page and are referred to by the stylesheet.

const STROKE = 'stroke="currentColor" stroke-width="0.6"';

export const PATTERNS =
  '<svg class="tl-patterns" width="0" height="0" aria-hidden="true"><defs>' +
  `<pattern id="tl-ordinates" width="6" height="6" patternUnits="userSpaceOnUse"><path ${STROKE} d="M3 0V6"/></pattern>` +
  `<pattern id="tl-slanted" width="6" height="6" patternUnits="userSpaceOnUse" patternTransform="rotate(45)"><path ${STROKE} d="M3 0V6"/></pattern>` +
  `<pattern id="tl-level" width="5" height="5" patternUnits="userSpaceOnUse"><path ${STROKE} d="M0 2.5H5"/></pattern>` +
  '</defs></svg>';
