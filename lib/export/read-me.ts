/** What stands in README.txt of an export. */
export const README = `A model with all that is known of it.

manifest.json            every file here with its size and SHA-256, this one and the manifest itself excepted
model.json               the model: name, note, revisions
revisions/N/
  revision.json          structure, status, who imported it and when
  history.json           every status it has had, with who, when and why
  findings.json          what the importer had to say about its file
  source/                the file as it was uploaded, byte for byte; its SHA-256 is "sourceDigest" in revision.json
  description.urdf       the description out of it, where an archive was uploaded
  canonical.json         the content that enters the computation (RFC 8785); its SHA-256 is the fingerprint
  meshes/                meshes and textures by their path in the archive
  reference-poses/       measured poses that were held against it: NAME.json the outcome, NAME.csv the table as it was sent
  check-vectors.json     configurations with pose, Jacobian and singular values of the default chain,
                         where the revision was released and that chain can be computed

To get a revision back, import what is in its source/ folder: the new one has the same fingerprint. Of an archive with several
descriptions, choose the one that "archive.entry" in revision.json names.

JSON is as the HTTP API answers it; lengths are m, angles rad, unless a file says otherwise. No password, key or session is in here.
`
