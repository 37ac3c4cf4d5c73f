import { type ReactNode, useState } from 'react';
import { View } from 'react-native';
import Svg from 'react-native-svg';

interface Props {
  /** What the graphic says, in one sentence; null when the text around it says so already. */
  readonly label: string | null;
  readonly height: number;
  /** Points; measured when left out. */
  readonly width?: number;
  readonly children: (width: number) => ReactNode;
}

/** A drawing that fills the width it is given and speaks as one image. */
export function ChartCanvas({ label, height, width, children }: Props) {
  const [measured, setMeasured] = useState(0);
  const shown = width ?? measured;
  return (
    <View
      {...(label === null ? ({ 'aria-hidden': true } as const) : ({ role: 'img', 'aria-label': label } as const))}
      style={{ height, width: width ?? '100%' }}
      onLayout={width === undefined ? ({ nativeEvent }) => setMeasured(nativeEvent.layout.width) : undefined}
    >
      {shown > 0 ? (
        <Svg width={shown} height={height}>
          {children(shown)}
        </Svg>
      ) : null}
    </View>
  );
}
