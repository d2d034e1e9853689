import { useState } from 'react';
import type { RouteObject } from 'react-router-dom';

/** A screen with something on it that would be lost if it were built anew. */
function PlainScreen({ name }: { name: string }) {
  const [text, setText] = useState('');
  return (
    <>
      <h1>The screen of {name}</h1>
      <label>
        Not sent yet
        <input
          value={text}
          onChange={(event) => {
            setText(event.target.value);
          }}
        />
      </label>
    </>
  );
}

/** 'pack/:part/:id?' is of pack. */
function nameOf(path: string): string {
  return path.split('/')[0] ?? path;
}

/** The routes as they are, with plain screens below the frame: the session is tested here, not the screens. */
export function withPlainScreens(routes: RouteObject[]): RouteObject[] {
  return routes.map((route): RouteObject => {
    if (route.index === true) return { index: true, element: <PlainScreen name="Today" /> };
    const children = route.children ? withPlainScreens(route.children) : undefined;
    const { path } = route;
    if (route.lazy !== undefined && path !== undefined && !path.startsWith('/')) {
      return { path, element: <PlainScreen name={nameOf(path)} /> };
    }
    return children ? { ...route, children } : route;
  });
}
