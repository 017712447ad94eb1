/*
 * Preloaded into a process, keeps beside each file the bytes that were last synced: on every fsync or fdatasync the
 * file is copied to <name>.synced. After the process was killed the copies put in place of the files are what a disk
 * would hold after a power cut in which everything not yet synced was lost.
 */
#define _GNU_SOURCE
#include <dlfcn.h>
#include <fcntl.h>
#include <limits.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>
#include <unistd.h>

static void keep(int fd) {
  const char *folder = getenv("POWER_CUT_FOLDER");
  char link[64], path[PATH_MAX], aside[PATH_MAX + 16], kept[PATH_MAX + 16], bytes[1 << 16];
  if (folder == NULL) return;
  snprintf(link, sizeof link, "/proc/self/fd/%d", fd);
  ssize_t length = readlink(link, path, sizeof path - 1);
  if (length < 0) return;
  path[length] = '\0';
  if (strncmp(path, folder, strlen(folder)) != 0 || strcmp(path, folder) == 0) return;
  snprintf(aside, sizeof aside, "%s.copying", path);
  snprintf(kept, sizeof kept, "%s.synced", path);
  int from = open(path, O_RDONLY), to = open(aside, O_WRONLY | O_CREAT | O_TRUNC, 0600);
  if (from < 0 || to < 0) abort();
  ssize_t got;
  while ((got = read(from, bytes, sizeof bytes)) > 0) {
    if (write(to, bytes, (size_t)got) != got) abort();
  }
  close(from);
  close(to);
  /* Renamed when whole, so that a kill in the middle leaves the copy of the sync before. */
  if (rename(aside, kept) != 0) abort();
}

int fsync(int fd) {
  int (*real)(int) = (int (*)(int))dlsym(RTLD_NEXT, "fsync");
  keep(fd);
  return real(fd);
}

int fdatasync(int fd) {
  int (*real)(int) = (int (*)(int))dlsym(RTLD_NEXT, "fdatasync");
  keep(fd);
  return real(fd);
}
