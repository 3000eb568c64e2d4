/** The package's main file is no module under Node, so its module build is imported by name; it has the same exports. */
declare module 'maxrects-packer/dist/maxrects-packer.mjs' {
  export { MaxRectsPacker, PACKING_LOGIC } from 'maxrects-packer';
}
