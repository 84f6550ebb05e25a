import { View } from 'react-native';
import { RoleGate } from '../layout/RoleGate';
import { Screen } from '../layout/Screen';
import { timeText } from '../layout/timeText';
import { errorInWords } from '../queries/errorInWords';
import { useOutbox } from '../queries/people';
import { Button } from '../ui/Button';
import { Disclosure } from '../ui/Disclosure';
import { QueryView } from '../ui/QueryView';
import { Text } from '../ui/Text';
import { AdministrationLinks } from './AdministrationLinks';

/** What the demonstration register mailed: nothing of it left this machine. */
export function OutboxScreen() {
  return (
    <RoleGate title="Outbox" roles={['administrator']}>
      <Outbox />
    </RoleGate>
  );
}

function Outbox() {
  const outbox = useOutbox();
  return (
    <Screen title="Outbox" sub="Mail of the demonstration register, newest first; nothing of it left this machine." actions={<AdministrationLinks current="outbox" />}>
      <View style={{ alignSelf: 'flex-start' }}>
        <Button label="Look again" working={outbox.isFetching} onPress={() => void outbox.refetch()} />
      </View>
      <QueryView
        pending={outbox.isPending}
        error={outbox.error ? errorInWords(outbox.error) : null}
        data={outbox.data}
        isEmpty={(items) => items.length === 0}
        empty={{ title: 'Nothing was sent yet.', text: 'Mail to those who must act is listed here.' }}
        onRetry={() => void outbox.refetch()}
      >
        {(items) => (
          <View>
            {items.map((mail) => (
              <Disclosure key={mail.id} label={mail.subject} note={`to ${mail.to}, ${timeText(mail.sentAt)}`}>
                <Text size="table" style={{ maxWidth: 640 }}>
                  {mail.text}
                </Text>
              </Disclosure>
            ))}
          </View>
        )}
      </QueryView>
    </Screen>
  );
}
