import type { Adapter, AdapterPayload } from "oidc-provider";

interface Entry {
  payload: AdapterPayload;
  /** Milliseconds since the epoch. */
  expiresAt: number;
}

/** Where the provider keeps its sessions, codes and grants: in memory, for as long as it runs. */
export function memoryAdapters(): (model: string) => Adapter {
  const all = new Map<string, Map<string, Entry>>();
  return (model) => {
    const entries = all.get(model) ?? new Map<string, Entry>();
    all.set(model, entries);
    return memoryAdapter(entries, all);
  };
}

function memoryAdapter(entries: Map<string, Entry>, all: Map<string, Map<string, Entry>>): Adapter {
  const findBy = async (matches: (payload: AdapterPayload, id: string) => boolean) => {
    for (const [id, { payload, expiresAt }] of entries) {
      if (expiresAt > Date.now() && matches(payload, id)) return payload;
    }
    return undefined;
  };
  const dropExpired = () => {
    for (const [id, { expiresAt }] of entries) if (expiresAt <= Date.now()) entries.delete(id);
  };

  return {
    upsert: async (id, payload, expiresIn) => {
      dropExpired();
      entries.set(id, { payload, expiresAt: expiresIn === undefined ? Infinity : Date.now() + expiresIn * 1000 });
    },
    find: (id) => findBy((_payload, known) => known === id),
    findByUid: (uid) => findBy((payload) => payload.uid === uid),
    findByUserCode: (userCode) => findBy((payload) => payload.userCode === userCode),
    consume: async (id) => {
      const entry = entries.get(id);
      if (entry) entry.payload.consumed = Math.floor(Date.now() / 1000);
    },
    destroy: async (id) => {
      entries.delete(id);
    },
    revokeByGrantId: async (grantId) => {
      for (const model of all.values()) {
        for (const [id, { payload }] of model) if (payload.grantId === grantId) model.delete(id);
      }
    },
  };
}
