"""Set up, build and serve the site: ``python3 build_scripts/serve.py``."""

import argparse
import sys

import environment


def main():
    """Carry out the command."""
    asked = argparse.ArgumentParser(description="Set up, build and serve Vitalroll on this machine.")
    asked.add_argument("--port", type=int, default=8000, help="port on 127.0.0.1 (8000)")
    asked.add_argument("--build-only", action="store_true", help="build into dist/ and stop")
    options = asked.parse_args()
    environment.enter("build")

    from make_dist import DIST, build

    build()
    if options.build_only:
        print("Built: dist/site/, dist/vitalroll.html and the wheel in dist/.")
        return
    from site_server import SiteServer

    try:
        server = SiteServer(DIST / "site", options.port)
    except OSError as fault:
        sys.exit(f"Port {options.port} cannot be used ({fault.strerror}). Choose another with --port.")
    print(f"Vitalroll is at {server.address} – stop it with Ctrl+C.", flush=True)
    try:
        server.serve_forever()
    except KeyboardInterrupt:
        print()


if __name__ == "__main__":
    main()
