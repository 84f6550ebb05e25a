/**
 * Stands in the web client for parts of the router that nothing uses (leaveOut.cjs). What would draw something
 * draws nothing or says so.
 */
function Absent() {
  throw new Error('This navigator is left out of the web client: see scripts/leaveOut.cjs.');
}

module.exports = {
  createNativeStackNavigator: () => ({ Navigator: Absent }),
  isNativeTabTrigger: () => false,
  // Set by the router for native screens; the web has none.
  featureFlags: { experiment: {} },
  // Told a developer that a route is being bundled.
  Toast: () => null,
  ToastWrapper: ({ children }) => children ?? null,
};
