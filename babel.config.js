// Metro finds its own preset; this file is for jest-expo, which does not.
module.exports = (api) => {
  api.cache(true);
  return { presets: ['babel-preset-expo'] };
};
