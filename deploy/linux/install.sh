#!/usr/bin/env bash
# Installs or upgrades LoadWatch as a systemd service, or removes it and keeps all data. Run it again at any time: what is right stays as it is.
set -euo pipefail
umask 022

usage() {
    cat <<'TEXT'
usage: install.sh [--print] [--root FOLDER] PUBLISHED   install or upgrade from a folder made by dotnet publish
       install.sh [--print] [--root FOLDER] --uninstall  remove program and unit; configuration, data, inbox and accounts stay
  --print        say what would be done, and do nothing
  --root FOLDER  install below this folder, for packages: no accounts, no owners, no systemctl
TEXT
}

readonly unit_source="${BASH_SOURCE[0]%/*}/loadwatch.service"
readonly user=loadwatch dropgroup=loadwatch-drop
print=false uninstall=false root="" published=""

while [ $# -gt 0 ]; do
    case "$1" in
        --print) print=true ;;
        --uninstall) uninstall=true ;;
        --root) root="${2:?--root needs a folder}"; shift ;;
        --help|-h) usage; exit 0 ;;
        -*) echo "unknown option $1" >&2; usage >&2; exit 64 ;;
        *) published="$1" ;;
    esac
    shift
done

readonly program="$root/opt/loadwatch" config="$root/etc/loadwatch" state="$root/var/lib/loadwatch" inbox="$root/srv/loadwatch/inbox"
readonly unit="$root/etc/systemd/system/loadwatch.service"

fail() { echo "$2" >&2; exit "$1"; }

# Says what is done, and does it unless only printing.
act() {
    printf '  %s\n' "$*"
    "$print" || "$@"
}

on_system() { [ -z "$root" ]; }
has_systemd() { on_system && [ -d /run/systemd/system ]; }
is_running() { has_systemd && systemctl is-active --quiet loadwatch.service; }

own() { # OWNER PATH, and all below it
    if on_system; then act chown -R "$1" "$2"; fi
}

make_folder() { # MODE OWNER PATH: what is there keeps the rights that somebody gave it
    if [ -d "$3" ]; then return 0; fi
    act mkdir -p "$3"
    own "$2" "$3"
    act chmod "$1" "$3"
    made=true
}

make_accounts() {
    on_system || return 0
    echo "Accounts"
    getent group "$user" >/dev/null || act groupadd --system "$user"
    getent group "$dropgroup" >/dev/null || act groupadd --system "$dropgroup"
    getent passwd "$user" >/dev/null \
        || act useradd --system --gid "$user" --home-dir "$state" --no-create-home --shell /usr/sbin/nologin "$user"
}

# Aside first, then two renames: a copy that breaks off leaves the old program as it was.
copy_program() {
    echo "Program"
    act rm -rf "$program.new" "$program.old"
    act mkdir -p "${program%/*}"
    act cp -R "$published" "$program.new"
    own root:root "$program.new"
    act chmod -R u=rwX,go=rX "$program.new"
    if is_running; then act systemctl stop loadwatch.service; fi
    if [ -d "$program" ]; then act mv "$program" "$program.old"; fi
    act mv "$program.new" "$program"
    act rm -rf "$program.old"
}

make_folders() {
    echo "Folders"
    make_folder 0750 "root:$user" "$config"
    make_folder 0700 "$user:$user" "$state"
    make_folder 0755 root:root "${inbox%/*}"
    made=false
    make_folder 2770 "root:$dropgroup" "$inbox"
    # Files that arrive with a tight mask are still readable by the group, so by the service.
    if "$made" && on_system && command -v setfacl >/dev/null; then act setfacl -d -m "g:$dropgroup:rwX" "$inbox"; fi
}

configuration() {
    cat <<'TEXT'
{
  // Comments and trailing commas are fine. loadwatch check names every fault with its line.
  "data": "/var/lib/loadwatch/data",        // archive of originals and database: back this up
  "pages": "/var/lib/loadwatch/pages",      // one page per contact
  "notices": "/var/lib/loadwatch/notices",  // one file of notices per month
  "time_zone": "",                          // blank: the zone of this machine; else for example "Europe/Helsinki"

  "inboxes": [
    { "name": "inbox", "path": "/srv/loadwatch/inbox", "take": "leave" }
  ],

  "groups": [
    { "id": "squad", "name": "Squad" }
  ],

  "contacts": [
    { "id": "staff", "name": "Staff", "role": "coach", "groups": ["squad"], "brief_at": "06:30" }
  ]
}
TEXT
}

put_new() { # SOURCE NAME: never over a file that is there
    if [ -e "$config/$2" ]; then
        echo "  $config/$2 is there and stays as it is"
        return 0
    fi
    act install -m 0640 "$1" "$config/$2"
    own "root:$user" "$config/$2"
}

write_configuration() {
    echo "Configuration"
    starter=$(mktemp -d)
    trap 'rm -rf "$starter"' EXIT
    "$published/loadwatch" init --dir "$starter/init" >/dev/null || fail 69 "$published/loadwatch does not start: is the .NET 10 runtime installed?"
    configuration >"$starter/loadwatch.json"
    put_new "$starter/loadwatch.json" loadwatch.json
    for table in "$starter"/init/*.csv; do
        put_new "$table" "${table##*/}"
    done
}

write_unit() {
    echo "Unit"
    act install -D -m 0644 "$unit_source" "$unit"
    if has_systemd; then act systemctl daemon-reload; fi
}

next_steps() {
    cat <<TEXT
Next
  1. Write a line for each person into $config/roster.csv, and what you know of them into $config/anchors.csv.
  2. Let those in who deliver recordings:     usermod -aG $dropgroup NAME
     and make a folder for each person:       install -d -m 2770 -g $dropgroup $inbox/PERSON
  3. Check the configuration:                 runuser -u $user -- $program/loadwatch check --config $config/loadwatch.json
  4. Start it, now and at every boot:         systemctl enable --now loadwatch
  5. See how it does:                         systemctl status loadwatch
                                              runuser -u $user -- $program/loadwatch status --config $config/loadwatch.json
TEXT
}

install_all() {
    [ -n "$published" ] || { usage >&2; exit 64; }
    [ -x "$published/loadwatch" ] || fail 66 "$published holds no program called loadwatch: make it with dotnet publish first"
    local was_running=false
    if is_running; then was_running=true; fi
    make_accounts
    make_folders
    write_configuration
    copy_program
    write_unit
    if "$was_running"; then act systemctl start loadwatch.service; fi
    next_steps
}

uninstall_all() {
    if has_systemd && [ -e "$unit" ]; then act systemctl disable --now loadwatch.service; fi
    act rm -f "$unit"
    act rm -rf "$program"
    if has_systemd; then act systemctl daemon-reload; fi
    echo "Kept: $config, $state, $inbox, the user $user and the group $dropgroup, for they own health data. Delete them yourself when nobody needs it."
}

if on_system && ! "$print" && [ "$(id -u)" -ne 0 ]; then
    fail 77 "installing needs root; --print shows what would be done"
fi
if "$print"; then echo "Nothing is done; this is what would be:"; fi
if "$uninstall"; then uninstall_all; else install_all; fi
