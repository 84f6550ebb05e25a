import { Pressable, Text, View } from 'react-native';

interface FailedAppProps {
  error: Error;
  retry: () => Promise<void>;
}

/** Shows when the frame around every page failed. It uses nothing of the app, since that is what failed. */
export function FailedApp({ retry }: FailedAppProps) {
  return (
    <View role="main" style={{ padding: 24, gap: 12, alignItems: 'flex-start' }}>
      <Text role="alert" style={{ fontSize: 17 }}>
        Allokarya could not be shown. It is the register's fault; what you sent is kept.
      </Text>
      <Pressable role="button" onPress={() => void retry()} style={{ paddingVertical: 12 }}>
        <Text style={{ fontSize: 17, textDecorationLine: 'underline' }}>Try again</Text>
      </Pressable>
    </View>
  );
}
