/** Debian packages whose programs the tests compare against or drive. */
export const TEST_PACKAGES = [
  'chromium',
  'potrace',
  'pngcheck',
  'libtiff-tools',
  'poppler-utils',
  'qpdf',
  'librsvg2-bin',
  'libvips-tools',
  'imagemagick',
  'python3-skimage',
  'python3-scipy',
  'python3-pil',
];
