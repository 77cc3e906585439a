import "./lib/zod-without-eval.ts";
import "./styles/main.css";
import { QueryClientProvider } from "@tanstack/react-query";
import { StrictMode } from "react";
import { createRoot } from "react-dom/client";
import { RouterProvider } from "react-router-dom";
import { createQueryClient } from "./lib/query-client.ts";
import { createRouter } from "./router.tsx";

const queries = createQueryClient();

createRoot(document.querySelector("#root")!).render(
  <StrictMode>
    <QueryClientProvider client={queries}>
      <RouterProvider router={createRouter()} />
    </QueryClientProvider>
  </StrictMode>,
);
