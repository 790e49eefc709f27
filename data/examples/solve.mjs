// Sends a file of cases to a Skewlight server and prints the Kerr angles of every point.
//
//     SKEWLIGHT_TOKEN=skw_... node data/examples/solve.mjs [cases.json]
//
// The token comes from your account page. SKEWLIGHT_URL names the server when it is not on this machine.

import { readFile } from 'node:fs/promises';

const server = process.env.SKEWLIGHT_URL ?? 'http://127.0.0.1:4310';
const token = process.env.SKEWLIGHT_TOKEN;
if (!token) throw new Error('Put an API token of your account page into SKEWLIGHT_TOKEN.');
const cases = await readFile(process.argv[2] ?? new URL('cases.json', import.meta.url), 'utf8');

const response = await fetch(`${server}/api/v1/solve`, {
  method: 'POST',
  headers: { Authorization: `Bearer ${token}`, 'Content-Type': 'application/json' },
  body: cases,
});
const answer = await response.json();
if (!response.ok) {
  console.error(answer.error.message);
  for (const { path, message } of answer.error.issues ?? []) console.error(`  ${path}: ${message}`);
  process.exit(1);
}

console.log('wavelength_nm angle_deg light rotation_deg ellipticity_deg');
for (const { points } of answer.results) {
  for (const { wavelengthNm, angleDeg, kerr } of points) {
    for (const light of ['p', 's']) {
      // Null where no light comes back that could have a polarization.
      const { rotationDeg = NaN, ellipticityDeg = NaN } = kerr[light] ?? {};
      console.log(wavelengthNm, angleDeg, light, rotationDeg.toFixed(4), ellipticityDeg.toFixed(4));
    }
  }
}
