/**
 * Parts of packages that the web client never reaches, left out of its bundle: no screen uses them, but the
 * packages name them, so the bundler would carry them along in the first view. Each entry says which file asks
 * (the end of its path), what it asks for, and what it gets instead: nothing, or a smaller file.
 */
const leftOut = require.resolve('./leftOut.cjs');

/** Layouts other than Slot, and previews of links, exist for native builds. */
const router = [
  { asker: 'expo-router/build/exports.js', asks: ['./layouts/Tabs', './layouts/experimental-stack', './views/Sitemap', './views/Unmatched'] },
  { asker: 'expo-router/build/index.js', asks: ['./stack', './color'] },
  { asker: 'expo-router/build/ExpoRoot.js', asks: ['./views/Sitemap'] },
  { asker: 'expo-router/build/getRoutes.js', asks: ['./views/Sitemap', './views/Unmatched'] },
  { asker: 'expo-router/build/layouts/StackClient.js', asks: ['./stack-utils'] },
  { asker: 'expo-router/build/layouts/StackClient.js', asks: ['../fork/native-stack/createNativeStackNavigator'], instead: leftOut },
  { asker: 'expo-router/build/layouts/withLayoutContext.js', asks: ['../native-tabs/NativeTabTrigger'], instead: leftOut },
  { asker: 'expo-router/build/link/ExpoLink.js', asks: ['./LinkWithPreview', './elements'] },
  { asker: 'expo-router/build/link/Link.js', asks: ['./elements'] },
  { asker: 'expo-router/build/screensFeatureFlags.js', asks: ['react-native-screens'], instead: leftOut },
  { asker: 'expo-router/build/views/SuspenseFallback.js', asks: ['./Toast'], instead: leftOut },
  { asker: 'expo-router/build/views/EmptyRoute.js', asks: ['./Toast'], instead: leftOut },
  { asker: 'expo-router/build/views/ErrorBoundary.js', asks: ['../react-navigation/bottom-tabs'], instead: '../react-navigation/bottom-tabs/utils/BottomTabBarHeightContext' },
];

/** Our own imports name each part of react-native-web by its file; only packages ask for its whole index. */
const controls = [
  {
    asker: 'react-native-web/dist/index.js',
    asks: [
      'Animated', 'Button', 'CheckBox', 'Clipboard', 'FlatList', 'ImageBackground', 'InputAccessoryView', 'LayoutAnimation', 'Picker', 'ProgressBar', 'SectionList',
      'Share', 'Switch', 'TouchableHighlight', 'TouchableNativeFeedback', 'TouchableOpacity', 'Vibration', 'VirtualizedList', 'YellowBox',
    ].map((name) => `./exports/${name}`),
  },
];

/** Messages in other languages, JSON Schema and compiled parsers: the client only parses. */
const schemas = [
  { asker: 'zod/v4/core/index.js', asks: ['../locales/index.js', './compile.js', './json-schema-generator.js', './json-schema-processors.js'] },
  { asker: 'zod/v4/classic/external.js', asks: ['../locales/index.js', './from-json-schema.js', '../core/json-schema-processors.js'] },
  { asker: 'zod/v4/classic/schemas.js', asks: ['../core/json-schema-processors.js'] },
];

const entries = [...router, ...controls, ...schemas];

/** What `asker` gets for `asked` in the web client: undefined as the package says, null nothing, or another request. */
function insteadOf(asker, asked) {
  const place = asker.replaceAll('\\', '/');
  const entry = entries.find((one) => place.endsWith(`/node_modules/${one.asker}`) && one.asks.includes(asked));
  return entry === undefined ? undefined : (entry.instead ?? null);
}

module.exports = { insteadOf };
