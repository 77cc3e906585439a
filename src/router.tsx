import type { QueryClient } from "@tanstack/react-query";
import { createBrowserRouter } from "react-router-dom";
import { NotFoundPage, ProblemPage } from "./shell/problem-page.tsx";
import { BareFrame, RootLayout } from "./shell/root-layout.tsx";

/** The route table: the only file that knows every feature. Pages load with their route. */
export function createRouter(_queries: QueryClient) {
  return createBrowserRouter([
    {
      element: <RootLayout />,
      errorElement: (
        <BareFrame>
          <ProblemPage />
        </BareFrame>
      ),
      // Problems of a page stay inside the frame; the outer one is for a frame that has no session to fill it.
      children: [{ errorElement: <ProblemPage />, children: [{ path: "*", element: <NotFoundPage /> }] }],
    },
  ]);
}
