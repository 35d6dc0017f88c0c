/** What is kept of an archive beside its description: meshes, their materials and textures, by the end of their names. */
export const MESH_MEDIA_TYPES: Readonly<Record<string, string>> = {
  stl: 'model/stl',
  dae: 'model/vnd.collada+xml',
  obj: 'model/obj',
  mtl: 'model/mtl',
  glb: 'model/gltf-binary',
  gltf: 'model/gltf+json',
  bin: 'application/octet-stream',
  png: 'image/png',
  jpg: 'image/jpeg',
  jpeg: 'image/jpeg',
  webp: 'image/webp',
  bmp: 'image/bmp',
  tga: 'image/x-tga',
  tif: 'image/tiff',
  tiff: 'image/tiff',
}

