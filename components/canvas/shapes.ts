/** Registers the Konva shapes that the board draws; the rest stays out of the bundle. */
import 'konva/lib/shapes/Arrow';
import 'konva/lib/shapes/Circle';
import 'konva/lib/shapes/Ellipse';
import 'konva/lib/shapes/Line';
import 'konva/lib/shapes/Rect';
import 'konva/lib/shapes/Text';
import 'konva/lib/shapes/Wedge';
