module.exports = async () => { await require('./run.cjs').database(); };
