import { View } from 'react-native';
import { makeStyles } from '@/components/theme';
import { Button } from '@/components/ui/button';
import { Text } from '@/components/ui/text';
import type { ActionContext, SketchAction } from './sketch-actions';

type SketchControlsProps = {
  label: string;
  actions: readonly SketchAction[];
  context: ActionContext;
  onAction: (action: SketchAction) => void;
};

/** A row of buttons for what can be done to the view. */
export function SketchControls({ label, actions, context, onAction }: SketchControlsProps) {
  const styles = useStyles();
  return (
    <View role="group" aria-label={label} style={styles.row} dataSet={{ print: 'hide' }}>
      {actions.map((action) => (
        <Button
          key={action.id}
          kind="plain"
          label={action.label}
          icon={
            action.sign === undefined ? undefined : (
              <Text variant="heading" level={null} aria-hidden>
                {action.sign}
              </Text>
            )
          }
          iconOnly={action.sign !== undefined}
          pressed={action.pressed?.(context.view)}
          disabled={!action.allowed(context)}
          onPress={() => onAction(action)}
        />
      ))}
    </View>
  );
}

const useStyles = makeStyles((t) => ({ row: { flexDirection: 'row', flexWrap: 'wrap', gap: t.space.sm } }));
