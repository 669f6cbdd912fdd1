const { getDefaultConfig } = require('expo/metro-config');

const config = getDefaultConfig(__dirname);
const passOn = config.resolver.resolveRequest;

// zod ships fifty languages of error text; the screens speak from their own catalogue, so one is enough on a phone.
config.resolver.resolveRequest = (context, name, platform) => {
  const resolve = passOn ?? context.resolveRequest;
  if (/zod.*v4.*core/.test(context.originModulePath) === false && /locales\/index\.(js|cjs)$/.test(name)) {
    return resolve(context, name.replace(/index\.(js|cjs)$/, 'en.$1'), platform);
  }
  return resolve(context, name, platform);
};

module.exports = config;
