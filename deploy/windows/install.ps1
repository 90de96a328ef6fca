#Requires -Version 5.1
<#
.SYNOPSIS
    Installs or upgrades LoadWatch as a Windows service with an account of its own, or removes it and keeps all data.
.DESCRIPTION
    Run it in an elevated PowerShell; run it again at any time. -WhatIf says what would be done and does nothing.
    A configuration that is there is never written over.
.PARAMETER Published
    The folder made by dotnet publish -r win-x64.
.PARAMETER ProgramFolder
    Where the program goes.
.PARAMETER WorkFolder
    Holds config, inbox, data, pages and notices.
.PARAMETER Uninstall
    Removes the service and the program. Configuration, data and inbox stay.
.EXAMPLE
    .\install.ps1 -Published C:\Temp\loadwatch -WhatIf
#>
[CmdletBinding(SupportsShouldProcess)]
param(
    [string] $Published,
    [string] $ProgramFolder = (Join-Path $env:ProgramFiles 'LoadWatch'),
    [string] $WorkFolder = (Join-Path $env:ProgramData 'LoadWatch'),
    [switch] $Uninstall
)

Set-StrictMode -Version Latest
$ErrorActionPreference = 'Stop'

$name = 'LoadWatch'
# The virtual account comes with the service, has no password and no right that is not given to it here.
$account = "NT SERVICE\$name"
$program = Join-Path $ProgramFolder 'loadwatch.exe'
$config = Join-Path $WorkFolder 'config'
$inbox = Join-Path $WorkFolder 'inbox'
$configFile = Join-Path $config 'loadwatch.json'

# By number, because their names are translated: the system, the administrators.
$system = '*S-1-5-18'
$administrators = '*S-1-5-32-544'

function Assert-Elevated {
    if ($WhatIfPreference) { return }
    $identity = [Security.Principal.WindowsPrincipal][Security.Principal.WindowsIdentity]::GetCurrent()
    if (-not $identity.IsInRole([Security.Principal.WindowsBuiltInRole]::Administrator)) {
        throw 'Installing needs an elevated PowerShell; -WhatIf shows what would be done.'
    }
}

function Invoke-Tool([string] $Tool, [string[]] $Words) {
    if ($PSCmdlet.ShouldProcess("$Tool $Words", 'run')) {
        & $Tool @Words | Out-Null
        if ($LASTEXITCODE -ne 0) { throw "$Tool $Words ended with $LASTEXITCODE" }
    }
}

function Get-InstalledService { Get-Service -Name $name -ErrorAction SilentlyContinue }

function Stop-Installed {
    $service = Get-InstalledService
    if ($service -and $service.Status -ne 'Stopped') {
        Stop-Service -Name $name
        if (-not $WhatIfPreference) { $service.WaitForStatus('Stopped', [TimeSpan]::FromSeconds(40)) }
    }
}

# Aside first: a copy that breaks off leaves the old program as it was.
function Copy-Program {
    $new = "$ProgramFolder.new"
    if (-not $PSCmdlet.ShouldProcess($ProgramFolder, "replace by a copy of $Published")) {
        Stop-Installed
        return
    }

    if (Test-Path $new) { Remove-Item -Recurse -Force $new }
    Copy-Item -Recurse -Path $Published -Destination $new
    Stop-Installed
    if (Test-Path $ProgramFolder) { Remove-Item -Recurse -Force $ProgramFolder }
    Move-Item -Path $new -Destination $ProgramFolder
}

function Register-Service {
    if (-not (Get-InstalledService)) {
        $line = "`"$program`" run --config `"$configFile`""
        New-Service -Name $name -DisplayName $name -BinaryPathName $line -StartupType Automatic `
            -Description 'Takes in training recordings overnight and tells staff in the morning.' | Out-Null
    }

    Invoke-Tool 'sc.exe' @('config', $name, 'obj=', $account, 'start=', 'delayed-auto')
    # Again after 5 s, 1 min, then every 5 min; also when the service itself reports a failure (failureflag), not only when it dies.
    Invoke-Tool 'sc.exe' @('failure', $name, 'reset=', '86400', 'actions=', 'restart/5000/restart/60000/restart/300000')
    Invoke-Tool 'sc.exe' @('failureflag', $name, '1')
    # No debugging pipes: they would show health data.
    $key = "HKLM:\SYSTEM\CurrentControlSet\Services\$name"
    if ($PSCmdlet.ShouldProcess("$key Environment", 'set DOTNET_EnableDiagnostics=0')) {
        New-ItemProperty -Path $key -Name Environment -PropertyType MultiString -Value @('DOTNET_EnableDiagnostics=0') -Force | Out-Null
    }
}

function Grant-Folder([string] $Folder, [string] $Right) {
    if (-not (Test-Path $Folder)) { New-Item -ItemType Directory -Force -Path $Folder | Out-Null }
    Invoke-Tool 'icacls.exe' @($Folder, '/inheritance:r', '/grant:r', "${system}:(OI)(CI)F", "${administrators}:(OI)(CI)F", "${account}:(OI)(CI)$Right")
}

# Closed to everybody else. The service reads its configuration and the inbox, and writes data, pages and notices.
function New-WorkFolder {
    Grant-Folder $WorkFolder 'RX'
    Grant-Folder $config 'RX'
    foreach ($folder in 'data', 'pages', 'notices') { Grant-Folder (Join-Path $WorkFolder $folder) 'M' }
    # An inbox that was opened to those who deliver stays as it is.
    if (-not (Test-Path $inbox)) { Grant-Folder $inbox 'RX' }
}

function Get-Configuration {
    $base = $WorkFolder.Replace('\', '/')
    @"
{
  // Comments and trailing commas are fine. loadwatch check names every fault with its line.
  "data": "$base/data",        // archive of originals and database: back this up
  "pages": "$base/pages",      // one page per contact
  "notices": "$base/notices",  // one file of notices per month
  "time_zone": "",             // blank: the zone of this machine; else for example "Europe/Helsinki"

  "inboxes": [
    { "name": "inbox", "path": "$base/inbox", "take": "leave" }
  ],

  "groups": [
    { "id": "squad", "name": "Squad" }
  ],

  "contacts": [
    { "id": "staff", "name": "Staff", "role": "coach", "groups": ["squad"], "brief_at": "06:30" }
  ]
}
"@
}

function Write-Configuration {
    $starter = Join-Path ([IO.Path]::GetTempPath()) ([Guid]::NewGuid().ToString('N'))
    if ($PSCmdlet.ShouldProcess($config, 'write the starting files that are missing')) {
        try {
            & (Join-Path $Published 'loadwatch.exe') init --dir $starter | Out-Null
            if ($LASTEXITCODE -ne 0) { throw 'The published program does not start: is the .NET 10 runtime installed?' }
            # .NET writes UTF-8 without a mark, whatever the version of PowerShell.
            if (-not (Test-Path $configFile)) { [IO.File]::WriteAllText($configFile, (Get-Configuration)) }
            Get-ChildItem -Path $starter -Filter '*.csv' |
                Where-Object { -not (Test-Path (Join-Path $config $_.Name)) } |
                ForEach-Object { Copy-Item -Path $_.FullName -Destination $config }
        }
        finally {
            if (Test-Path $starter) { Remove-Item -Recurse -Force $starter }
        }
    }
}

# Warnings and failures go to the application log, too; without the source the log files remain.
function Register-EventSource {
    if ($PSCmdlet.ShouldProcess("event source $name", 'create') -and -not [Diagnostics.EventLog]::SourceExists($name)) {
        [Diagnostics.EventLog]::CreateEventSource($name, 'Application')
    }
}

function Write-NextSteps {
    Write-Output @"
Next
  1. Write a line for each person into $config\roster.csv, and what you know of them into $config\anchors.csv.
  2. Make a folder for each person below $inbox, and let those in who deliver recordings:
       icacls "$inbox" /grant "DOMAIN\Group:(OI)(CI)M"
  3. Let those in who read the pages:
       icacls "$(Join-Path $WorkFolder 'pages')" /grant "DOMAIN\Staff:(OI)(CI)RX"
  4. Check the configuration:  & "$program" check --config "$configFile"
  5. Start it:                 Start-Service $name
  6. See how it does:          & "$program" status --config "$configFile"
"@
}

function Install-All {
    if (-not $Published -or -not (Test-Path (Join-Path $Published 'loadwatch.exe'))) {
        throw "-Published names no folder with loadwatch.exe: make it with dotnet publish -r win-x64 first."
    }

    $service = Get-InstalledService
    $wasRunning = $service -and $service.Status -eq 'Running'
    Copy-Program
    Register-Service
    New-WorkFolder
    Write-Configuration
    Register-EventSource
    if ($wasRunning) { Start-Service -Name $name }
    Write-NextSteps
}

function Uninstall-All {
    Stop-Installed
    if (Get-InstalledService) { Invoke-Tool 'sc.exe' @('delete', $name) }
    if (Test-Path $ProgramFolder) { Remove-Item -Recurse -Force $ProgramFolder }
    Write-Output "Kept: $WorkFolder with configuration, inbox and data, for it holds health data. Delete it yourself when nobody needs it."
}

Assert-Elevated
if ($Uninstall) { Uninstall-All } else { Install-All }
