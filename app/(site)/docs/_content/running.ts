import type { Block, DocPage } from "./page";
import { readmeSettings } from "./readme-settings";

/** Where the examples of this page have the data, and what people type. */
const DATA = "/var/lib/rhoform";
const ORIGIN = "https://rhoform.example";

const shell = (label: string, code: string): Block => ({
  snippets: [{ language: "sh", label, code, shownOnly: true }],
});

/** What the unit below sets, for commands that are not started by it. */
const OF_THE_SERVICE = `export RHOFORM_DATA=${DATA} RHOFORM_ORIGIN=${ORIGIN}`;

export const running: DocPage = {
  slug: "running",
  title: "Running the service",
  summary: "Install, settings, a proxy in front, backup and restore, upgrades, monitoring.",
  sections: ({ origin }) => [
    {
      id: "install",
      title: "Install",
      blocks: [
        "One process, one SQLite file, one folder of data. It needs Node 20 and, to compile the database library, python3, make and a C++ compiler.",
        shell("on Debian", "apt-get install -y python3 make g++\nnpm start"),
        "`npm start` installs what is missing, builds once, brings the database up to date and serves. `RHOFORM_DEMO=0` leaves out the demo company. To keep it running, let a service manager start it in the repository’s folder and stop it with SIGTERM: running requests are finished, and field solutions that were under way are taken up again at the next start.",
        {
          snippets: [
            {
              language: "text",
              label: "/etc/systemd/system/rhoform.service",
              code: [
                "[Unit]",
                "Description=Rhoform",
                "After=network.target",
                "",
                "[Service]",
                "User=rhoform",
                "WorkingDirectory=/srv/rhoform",
                `Environment=NODE_ENV=production RHOFORM_DATA=${DATA} RHOFORM_DEMO=0`,
                `Environment=RHOFORM_ORIGIN=${ORIGIN} RHOFORM_TRUSTED_PROXIES=127.0.0.1`,
                "ExecStart=/usr/bin/node lib/cli/start.mjs",
                "Restart=on-failure",
                "",
                "[Install]",
                "WantedBy=multi-user.target",
              ].join("\n"),
              shownOnly: true,
            },
          ],
        },
        "Both folders belong to the user `rhoform`: the start installs and builds in the one and writes the database into the other. The first start takes a few minutes; `journalctl -u rhoform -f` shows how far it is.",
        "`npm run api` serves the API alone, without the pages, several times the calls a second.",
      ],
    },
    {
      id: "settings",
      title: "Settings",
      blocks: [
        "All settings are environment variables. They are checked at start, and a wrong one is told in one sentence.",
        { table: { head: ["variable", "default", "meaning"], rows: readmeSettings() } },
      ],
    },
    {
      id: "people",
      title: "People and mail",
      blocks: [
        "The first administrator is made in a shell, in the repository’s folder. The command prints a link with which to choose a password; it works once.",
        shell(
          "shell, while the service runs",
          [
            OF_THE_SERVICE,
            "npm run -s people -- add-admin ada@company.example",
            "npm run -s people -- list",
          ].join("\n"),
        ),
        "All commands of the shell read the same settings as the service: without its `RHOFORM_DATA` they would open another database, without its `RHOFORM_ORIGIN` their links would lead elsewhere. Run them as the user that the service runs as.",
        "Everyone else is invited in the console. Invitations and links for new passwords go out by the mail server of `RHOFORM_SMTP_URL`, from the address in `RHOFORM_MAIL_FROM`. Without them no mail leaves: administrators read the messages in the console and pass the links on. “Send me a test mail” in the [settings](/console/settings) shows whether the server takes them.",
      ],
    },
    {
      id: "teams",
      title: "Teams and keys in a shell",
      blocks: [
        shell(
          "shell, while the service runs",
          [
            OF_THE_SERVICE,
            'npm run -s teams -- add busbar --name "Busbar"',
            "npm run -s teams -- list",
            'npm run -s keys -- issue --team busbar --name "CAD scripts" --scopes compute,field',
            "npm run -s keys -- list",
          ].join("\n"),
        ),
      ],
    },
    {
      id: "proxy",
      title: "A proxy in front",
      blocks: [
        "The service speaks plain HTTP on 127.0.0.1; encryption is the proxy’s. Set `RHOFORM_ORIGIN` to the address that people type: cookies, links and the widgets’ pages depend on it, and with `https:` browsers are told to stay on it. `X-Forwarded-For` counts only from the addresses in `RHOFORM_TRUSTED_PROXIES`.",
        {
          snippets: [
            {
              language: "text",
              label: "nginx",
              code: [
                "server {",
                "  listen 443 ssl;",
                "  server_name rhoform.example;",
                "  ssl_certificate     /etc/ssl/rhoform.pem;",
                "  ssl_certificate_key /etc/ssl/rhoform.key;",
                "  client_max_body_size 20m;   # a batch",
                "",
                "  location / {",
                "    proxy_pass http://127.0.0.1:3000;",
                "    proxy_http_version 1.1;",
                "    proxy_set_header Host $host;",
                "    proxy_set_header X-Forwarded-For $proxy_add_x_forwarded_for;",
                "    proxy_set_header X-Forwarded-Proto $scheme;",
                "    proxy_buffering off;          # progress of field solutions, streamed batches",
                "    proxy_read_timeout 120s;",
                "  }",
                "}",
              ].join("\n"),
              shownOnly: true,
            },
          ],
        },
      ],
    },
    {
      id: "backup",
      title: "Backup and restore",
      blocks: [
        "`npm run backup -- <folder>` copies the database and the rest of the data folder consistently while the service runs. The copy holds the service’s secret: keep it as safe as the data folder itself. The logs are not in it.",
        shell("backup", `${OF_THE_SERVICE}\nnpm run backup -- /backup/rhoform-monday`),
        "To restore, stop the service, put the copy in the place of the data folder, and start:",
        shell(
          "restore",
          [
            "systemctl stop rhoform",
            "mv /var/lib/rhoform /var/lib/rhoform.before",
            "cp -a /backup/rhoform-monday /var/lib/rhoform",
            "chown -R rhoform: /var/lib/rhoform",
            "systemctl start rhoform",
          ].join("\n"),
        ),
      ],
    },
    {
      id: "upgrade",
      title: "Upgrade",
      blocks: [
        "Read the [changelog](/docs/changelog), make a backup, replace the repository’s files, and start. The start installs, builds and migrates the database by itself. A database that was migrated is not for the version before: to go back, restore the backup with the old files. Then [replay your records](/docs/records#replay).",
      ],
    },
    {
      id: "monitoring",
      title: "Monitoring",
      blocks: [
        "`GET /health` answers without a key as long as the service lives.",
        {
          snippets: [
            {
              language: "sh",
              label: "a probe",
              code: `curl -sf ${origin}/api/v1/health`,
              prints: '"status":"ok"',
            },
          ],
        },
        "Logs are JSON, a line an event, in `log/rhoform.jsonl` of the data folder or on the standard output (`RHOFORM_LOG`). A request’s line has its id, which is the `instance` of a problem. No key, address with a key or body is in them.",
        "What to watch: answers of 500 (each is a defect), of 503 (too much load), the disk of the data folder, and the age of the last backup.",
      ],
    },
  ],
};
