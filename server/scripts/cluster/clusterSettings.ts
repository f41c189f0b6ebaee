/**
 * For a small machine that serves other things as well. `durable` keeps everything that was committed through a
 * crash of the machine; tests don't need that, and are quicker without (PostgreSQL manual, "Non-Durable Settings").
 * Commits stay synchronous for both: tests kill the server, and nothing committed may be lost by that.
 */
export function clusterSettings({ isDurable }: { isDurable: boolean }): Record<string, string> {
  return {
    listen_addresses: '127.0.0.1',
    // Loopback with a password is the one way in: a socket's folder would have to be shared with other users.
    unix_socket_directories: '',
    max_connections: '100',
    shared_buffers: '128MB',
    effective_cache_size: '512MB',
    work_mem: '8MB',
    maintenance_work_mem: '64MB',
    max_wal_size: '512MB',
    wal_compression: 'on',
    // Short queries only: compiling them costs more than it gains.
    jit: 'off',
    // The data lie on a local disk, most likely one without moving parts.
    random_page_cost: '1.1',
    timezone: 'UTC',
    log_timezone: 'UTC',
    log_min_messages: 'warning',
    // Statements may carry values of people's: they stay out of the log.
    log_min_error_statement: 'panic',
    log_checkpoints: 'off',
    ...(isDurable ? {} : { fsync: 'off', full_page_writes: 'off' }),
  };
}
