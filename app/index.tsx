import { Text } from 'react-native';

export default function Index() {
  return <Text>One line of text</Text>;
}
