@echo off
rem Starts Modestead with the classes of an earlier run, see the script modestead beside this one.
setlocal
set "jar=%~dp0modestead.jar"
set "java=java"
if defined JAVA_HOME set "java=%JAVA_HOME%\bin\java"
rem A job is over soon: only what runs very often is worth the full compiler's work.
set "job=-XX:+UseParallelGC -XX:Tier4InvocationThreshold=50000 -XX:Tier4MinInvocationThreshold=6000 -XX:Tier4CompileThreshold=150000 -XX:Tier4BackEdgeThreshold=400000"
set "folder=%LOCALAPPDATA%\modestead"
for %%f in ("%jar%") do set "stamp=%%~zf-%%~tf"
set "stamp=%stamp:/=%"
set "stamp=%stamp::=%"
set "stamp=%stamp: =%"
set "kept=%folder%\classes-%stamp%.jsa"
if exist "%kept%" (
    "%java%" -XX:SharedArchiveFile="%kept%" -Xshare:auto -Xlog:disable -Xlog:all=error:stderr %job% %MODESTEAD_OPTIONS% -jar "%jar%" %*
    exit /b
)
if not "%~1"=="run" (
    "%java%" %job% %MODESTEAD_OPTIONS% -jar "%jar%" %*
    exit /b
)
if not exist "%folder%" mkdir "%folder%"
"%java%" -XX:ArchiveClassesAtExit="%kept%" -Xlog:disable -Xlog:all=error:stderr %job% %MODESTEAD_OPTIONS% -jar "%jar%" %*
exit /b
