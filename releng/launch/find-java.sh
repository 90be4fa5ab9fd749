# Read by the start scripts; not a program of its own.
#
# find_java PROGRAM TOOL sets JAVA_HOME to a Java of version 21 or newer that has bin/TOOL: the one
# in JAVA_HOME if it is new enough, else the newest found in the usual places. The version found is
# left in java_version. Where there is none, one line says so and the status is 1. JDK_SEARCH, if
# set, replaces the places that are searched. Only the shell's own commands run on the way, because
# the command line waits for this.

java_needed=21

# Sets v to the major version of the Java in $1, or to 0 where bin/$2 is missing.
java_major() {
	v=0
	[ -x "$1/bin/$2" ] || return 0
	if [ -r "$1/release" ]; then
		while IFS='=' read -r java_key java_value; do
			if [ "$java_key" = JAVA_VERSION ]; then
				v=${java_value#\"}
				v=${v%%[!0-9]*}
			fi
		done <"$1/release"
	else
		v=$("$1/bin/java" -version 2>&1 | sed -n '1s/[^"]*"\([0-9]*\).*/\1/p')
	fi
	case $v in '' | *[!0-9]*) v=0 ;; esac
}

find_java() {
	java_major "${JAVA_HOME:-/nonexistent}" "$2"
	java_version=$v
	if [ "$v" -lt $java_needed ]; then
		java_best=
		java_on_path=$(command -v "$2" || true)
		if [ -n "$java_on_path" ]; then
			java_on_path=$(readlink -f "$java_on_path")
			java_on_path=${java_on_path%/bin/*}
		fi
		for java_dir in ${JDK_SEARCH:-/usr/lib/jvm/* /opt/java/* /opt/jdk* "${HOME:-}"/.sdkman/candidates/java/* \
			/Library/Java/JavaVirtualMachines/*/Contents/Home} ${java_on_path:+"$java_on_path"}; do
			java_major "$java_dir" "$2"
			if [ "$v" -ge $java_needed ] && [ "$v" -gt "$java_version" ]; then
				java_version=$v
				java_best=$java_dir
			fi
		done
		if [ -z "$java_best" ]; then
			echo "$1: Java $java_needed or newer is needed; install a JDK or set JAVA_HOME to one (JAVA_HOME is '${JAVA_HOME:-}')" >&2
			return 1
		fi
		JAVA_HOME=$java_best
	fi
	export JAVA_HOME
}
