// Parsed by whatever Node is installed: no syntax newer than modules.

/** Ends the process with a plain message where Node is older than package.json's `engines` asks for. */
export function requireNode() {
  const wanted = [20, 19];
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major > wanted[0] || (major === wanted[0] && minor >= wanted[1])) return;
  console.error('Oriel needs Node ' + wanted.join('.') + ' or newer; this is Node ' + process.versions.node + '.');
  console.error('Install a newer one from https://nodejs.org, then run this again.');
  process.exit(1);
}
