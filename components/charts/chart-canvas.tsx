import { type ReactNode, useState } from 'react';
import { View } from 'react-native';
import Svg from 'react-native-svg';

interface Props {
  /** What the graphic says, in one sentence; null when the text around it says so already. */
  readonly label: string | null;
  /** Points; one that follows the width is a function of it. */
  readonly height: number | ((width: number) => number);
  /** Points; measured when left out. */
  readonly width?: number;
  readonly children: (width: number) => ReactNode;
}

/** A drawing that fills the width it is given and speaks as one image. */
export function ChartCanvas({ label, height, width, children }: Props) {
  const [measured, setMeasured] = useState(0);
  const shown = width ?? measured;
  const drawnHeight = typeof height === 'number' ? height : height(shown);
  return (
    <View
      {...(label === null ? ({ 'aria-hidden': true } as const) : ({ role: 'img', 'aria-label': label } as const))}
      style={{ height: drawnHeight, width: width ?? '100%' }}
      onLayout={width === undefined ? ({ nativeEvent }) => setMeasured(nativeEvent.layout.width) : undefined}
    >
      {shown > 0 ? (
        <Svg width={shown} height={drawnHeight}>
          {children(shown)}
        </Svg>
      ) : null}
    </View>
  );
}
