// A picture or font that a module names: jest needs its address only, and has no bundler to make one.
const path = require('node:path');

module.exports = { process: (_source, file) => ({ code: `module.exports = ${JSON.stringify(path.basename(file))};` }) };
