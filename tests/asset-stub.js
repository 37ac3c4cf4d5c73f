module.exports = 'asset-stub';
